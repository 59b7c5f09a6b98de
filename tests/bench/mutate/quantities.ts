import { replaced, type Mutator } from './mutator.ts';
import type { Random } from './random.ts';
import { EXTREMES, UNITS } from './vocabulary.ts';

const NUMBER = /(?<![\w.])\d+(?:\.\d+)?(?:e[+-]?\d+)?(?![\w.])/g;
const QUANTITY = /(?<![\w.])\d+(?:\.\d+)? [A-Za-z%][A-Za-z0-9%/^]*/g;

/** Changes of numbers and units: most leave a sheet that still evaluates, with values that nobody foresaw. */
export const mutateQuantities: Mutator = (text, random, others) => random.weighted(CHANGES)(text, random, others);

const CHANGES: readonly (readonly [number, Mutator])[] = [
  [3, (text, random) => replaced(text, random, NUMBER, (number) => nudged(number, random))],
  [3, (text, random) => replaced(text, random, NUMBER, () => random.pick(EXTREMES))],
  [2, (text, random) => replaced(text, random, QUANTITY, (quantity) => rangeOver(quantity, random))],
  [2, (text, random) => replaced(text, random, QUANTITY, (quantity) => otherUnit(quantity, random))],
  [1, (text, random) => replaced(text, random, QUANTITY, (quantity) => quantity.replace(' ', ''))],
  [1, (text, random) => text.replace(NUMBER, (number) => (random.chance(0.3) ? nudged(number, random) : number))],
];

/** Another number of the same kind: a step away, or many powers of ten. */
export function nudged(number: string, random: Random): string {
  const value = Number(number);
  return random.pick([
    String(value * 10 ** (random.below(13) - 6)),
    String(value * 10 ** (random.below(601) - 300)),
    String(-value),
    String(value + 1),
    `${number}.${random.below(1000)}`,
    `${number}e${random.below(40) - 20}`,
    String(random.next()),
    String(random.below(100)),
  ]);
}

/** `905 psig` as a range of values along an axis: short as a rule, now and then as long as it gets, or upside down. */
export function rangeOver(quantity: string, random: Random): string {
  const [number = '1', unit = '1'] = quantity.split(' ');
  const from = Number(number);
  const points = random.chance(0.02) ? 20_000 : 1 + random.below(30);
  const step = random.pick([1, 0.1, from / 20]);
  return random.weighted<string>([
    [8, `${from}..${from + step * points} ${unit} step ${step} ${unit}`],
    [1, `${from}..${from + step * points} ${unit}`],
    [1, `${from}..${from} ${unit} step ${step} ${unit}`],
    [1, `${from + step * points}..${from} ${unit} step ${step} ${unit}`],
    [1, `${from}..${from + step * points} ${unit} step ${random.pick(['0', '-1', '1e-300', '1e300'])} ${unit}`],
    [1, `${from}..${from + step * points} ${unit} step ${step} ${random.pick(UNITS)}`],
  ]);
}

function otherUnit(quantity: string, random: Random): string {
  return `${quantity.split(' ')[0] ?? ''} ${random.pick(UNITS)}`;
}
