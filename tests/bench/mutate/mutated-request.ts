import type { EvaluateRequest, Override } from '../../../core/evaluate/request.ts';
import { mutateBytes } from './bytes.ts';
import type { Sheet } from './corpus.ts';
import { mutateFormulas } from './formulas.ts';
import { mutateLines } from './lines.ts';
import type { Mutator } from './mutator.ts';
import { mutateQuantities } from './quantities.ts';
import { randomOf, type Random } from './random.ts';
import { mutateTree } from './tree.ts';
import { EXTREMES, SCRAPS, UNITS } from './vocabulary.ts';

const MUTATORS: readonly (readonly [number, Mutator])[] = [
  [2, mutateBytes],
  [2, mutateLines],
  [3, mutateQuantities],
  [2, mutateTree],
  [5, mutateFormulas],
];

/** One case of a run. The same corpus, seed and index give the same case, whatever ran before. */
export function mutatedRequest(corpus: readonly Sheet[], seed: number, index: number): EvaluateRequest {
  const random = randomOf(seed, index);
  const { entry, files } = random.pick(corpus);
  const name = random.chance(0.8) ? entry : random.pick(files).name;
  const others = corpus.flatMap((sheet) => sheet.files.map((file) => file.text));
  return {
    entry,
    files: files.map((file) => (file.name === name ? { name, text: mutated(file.text, random, others) } : file)),
    ...(random.chance(0.2) ? { units: random.pick(['us', 'si'] as const) } : {}),
    ...(random.chance(0.05) ? { condition: random.pick(['C01', 'C03', 'C99', '', '\ud800']) } : {}),
    ...(random.chance(0.1) ? { overrides: overrides(files.map(({ text }) => text).join('\n'), random) } : {}),
  };
}

/** Few changes as a rule, so that most of the sheet still makes sense and the later phases have work. */
function mutated(text: string, random: Random, others: readonly string[]): string {
  let changed = text;
  do changed = random.weighted(MUTATORS)(changed, random, others);
  while (random.chance(0.45));
  return changed;
}

function overrides(text: string, random: Random): Override[] {
  const names = [...text.matchAll(/^ {2}([A-Za-z]\w*):/gm)].map((match) => match[1] ?? '');
  const value = random.pick([
    ...EXTREMES,
    ...SCRAPS,
    `${random.below(500)} ${random.pick(UNITS)}`,
    '1..5 rpm step 1 rpm',
  ]);
  return [{ name: names.length > 0 && random.chance(0.9) ? random.pick(names) : random.pick(SCRAPS), value }];
}
