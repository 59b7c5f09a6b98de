import type { Random } from './random.ts';
import { EXAMPLE_CALLS, EXTREMES, FUNCTIONS, UNITS } from './vocabulary.ts';

const OPERATORS = ['+', '-', '*', '/', '^', ' * ', ' - '];
const COMPARISONS = ['<', '<=', '>', '>=', '==', '!='];
const TEXTS = ["'Sch 40'", "'Sch 80'", "'speed'", "'condition'", "'harmonic'", "'C01'", "'C02'", '"x"', "''"];

/** A random expression of the formula language over the given names: sound in its form, seldom in its units. */
export function expression(random: Random, names: readonly string[], depth: number): string {
  const inner = (): string => expression(random, names, depth - 1 - random.below(2));
  if (depth <= 0) return operand(random, names);
  return random.weighted<() => string>([
    [4, () => operand(random, names)],
    [4, () => inner() + random.pick(OPERATORS) + inner()],
    [3, () => call(random, inner)],
    [2, () => `(${inner()})`],
    [1, () => `-${inner()}`],
    [1, () => random.pick(EXAMPLE_CALLS)],
    [1, () => `where(${comparison(random, inner)}, ${inner()}, ${inner()})`],
    [0.5, () => `at(${inner()}, ${random.pick(TEXTS)}, ${random.pick([...TEXTS, inner()])})`],
    [0.5, () => `${inner()}^${random.pick(['2', '0.5', '-1', '(1/2)', '0', '400', '-400', '1e9', '2 m'])}`],
    [0.3, () => `${'('.repeat(random.pick([5, 19, 21, 200]))}${inner()}`],
    [0.2, () => Array.from({ length: random.pick([20, 300]) }, () => operand(random, names)).join('+')],
    [0.3, () => comparison(random, inner)],
  ])();
}

/** A comparison, as checks and `where` hold it. */
export function comparison(random: Random, side: () => string): string {
  return `${side()} ${random.pick(COMPARISONS)} ${side()}`;
}

/** The formula in a dress that keeps its dimension where the formula has one: what passes the type check and then computes. */
export function dressed(random: Random, formula: string, names: readonly string[]): string {
  const [core = '', ...unit] = formula.split(/( to (?=[^()]*$))/);
  const f = `(${core})`;
  const k = random.pick(['2', '0', '1e308', '1e-320', '-1', '1e200', '5e-324', '0.1', '(1/3)', '(0*1)', '1e150']);
  const name = names.length > 0 ? random.pick(names) : '1';
  const worn = random.pick([
    `${f}*${k}`, `${f}/${k}`, `-${f}`, `abs(${f})`, `max(${f}, ${f})`, `min(${f}, ${f}*${k})`, `mean(${f}, ${f})`,
    `${f} + ${f}`, `${f} - ${f}`, `${f}^2/${f}`, `sqrt(${f}^2)`, `${f}*(${name}/${name})`, `${f}*(${name} - ${name})/${name}`,
    `where(${name} > ${name}, ${f}, ${f}*${k})`, `where(${f} >= ${f}*${k}, ${f}, ${f})`, `max_over(${f}, 'speed')`,
    `max_over(${f}, 'condition')`, `envelope(${f})`, `sum_over(${f}*harmonics(5), 'harmonic')`, `${f}*exp(${k})`,
    `${f}*harmonics(${random.pick(['3', '40', '500', '501', '0', '1.5'])})`, `${f}*sin(${k} rad)`, `${f}*ln(${k})`,
    `at(${f}, 'condition', 'C01')`, `${f}*max_over(harmonics(5), 'harmonic')`, `${f}*log10(${k})`, `${f}^1`, `${f}^0*${f}`,
  ]); // prettier-ignore
  return worn + unit.join('');
}

function operand(random: Random, names: readonly string[]): string {
  return random.weighted<() => string>([
    [6, () => (names.length > 0 ? random.pick(names) : 'x')],
    [2, () => String(random.below(1000) / random.pick([1, 10, 1000]))],
    [3, () => `${random.below(1000) / 10} ${random.pick(UNITS)}`],
    [0.5, () => random.pick(EXTREMES)],
    [0.5, () => random.pick(TEXTS)],
    [0.5, () => random.pick(['pi', 'e', 'p.q', 'x[1]', 'f(x)(y)', '5 ft 3-1/2 in', '1..5 rpm step 1 rpm', '1..3'])],
  ])();
}

function call(random: Random, argument: () => string): string {
  const { name, arity } = random.pick(FUNCTIONS);
  const count = random.chance(0.85) ? arity : random.below(5);
  return `${name}(${Array.from({ length: count }, argument).join(', ')})`;
}
