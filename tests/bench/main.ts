/**
 * `npm run bench`: speed as ratios taken in one run, so that they mean the same on every machine. Goals beside them.
 * `npm run bench -- fuzz`: mutated sheets in great number, each of which must give a report or faults with a place.
 */
import { parseArgs } from 'node:util';
import { benchEvaluate } from './evaluate.ts';
import { benchFormulas } from './formulas.ts';
import { fuzz } from './fuzz.ts';
import { benchStartup } from './startup.ts';

export interface Line {
  readonly what: string;
  readonly measured: string;
  readonly ratio: string;
  readonly goal: string;
}

const { positionals, values } = parseArgs({
  allowPositionals: true,
  options: {
    seed: { type: 'string', default: '1' },
    sheets: { type: 'string' },
    'limit-ms': { type: 'string', default: '2000' },
    case: { type: 'string' },
  },
});
const onlyFuzz = positionals[0] === 'fuzz';

if (!onlyFuzz) tell([...(await benchStartup()), ...(await benchEvaluate()), ...(await benchFormulas())]);
const failures = await fuzz({
  sheets: Number(values.sheets ?? (onlyFuzz ? 200_000 : 5_000)),
  seed: Number(values.seed),
  limitMs: Number(values['limit-ms']),
  ...(values.case === undefined ? {} : { only: Number(values.case) }),
});
process.exitCode = failures > 0 ? 1 : 0;

function tell(lines: readonly Line[]): void {
  const widths = (['what', 'measured', 'ratio', 'goal'] as const).map((key) =>
    Math.max(key.length, ...lines.map((line) => line[key].length)),
  );
  const row = (cells: readonly string[]): string =>
    cells
      .map((cell, i) => cell.padEnd(widths[i] ?? 0))
      .join('   ')
      .trimEnd();
  console.log(row(['what', 'measured', 'ratio', 'goal']));
  for (const { what, measured, ratio, goal } of lines) console.log(row([what, measured, ratio, goal]));
}
