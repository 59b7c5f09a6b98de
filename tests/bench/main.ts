/** `npm run bench`: speed as ratios taken in one run, so that they mean the same on every machine. Goals beside them. */
import { benchEvaluate } from './evaluate.ts';
import { benchStartup } from './startup.ts';

export interface Line {
  readonly what: string;
  readonly measured: string;
  readonly ratio: string;
  readonly goal: string;
}

const lines = [...(await benchStartup()), ...(await benchEvaluate())];
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
