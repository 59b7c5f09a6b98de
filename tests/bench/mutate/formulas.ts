import { isPair, isScalar, parseDocument, visit, type Node, type Pair, type Scalar } from 'yaml';
import { comparison, dressed, expression } from './expression.ts';
import { splice, type Mutator } from './mutator.ts';
import { nudged, rangeOver } from './quantities.ts';
import type { Random } from './random.ts';
import { EXTREMES, UNITS } from './vocabulary.ts';

type Role = 'formula' | 'comparison' | 'quantity' | 'unit' | 'prose';

interface Place {
  readonly role: Role;
  readonly text: string;
  readonly start: number;
  readonly end: number;
}

/** What a scalar is by the key that it stands under, or by the key above its name. */
const ROLES: ReadonlyMap<string, Role> = new Map<string, Role>([
  ['calc', 'formula'], ['steps', 'formula'], ['of', 'formula'], ['limit', 'formula'], ['that', 'comparison'],
  ['value', 'quantity'], ['inputs', 'quantity'], ['fractions', 'quantity'], ['tolerance', 'quantity'],
  ['range', 'quantity'], ['expect', 'quantity'], ['rows', 'quantity'], ['atmosphere', 'quantity'],
  ['normal_state', 'quantity'], ['standard_state', 'quantity'], ['unit', 'unit'], ['columns', 'unit'],
  ['text', 'prose'], ['note', 'prose'], ['title', 'prose'], ['label', 'prose'], ['assumptions', 'prose'],
  ['symbol', 'prose'],
]); // prettier-ignore

/** Changes of formulas, quantities and prose where they stand, all else of the sheet being left alone. */
export const mutateFormulas: Mutator = (text, random, others) => {
  const { places, names } = others.includes(text) ? readOnce(text) : read(text);
  if (places.length === 0) return text;
  const roles = [...new Set(places.map(({ role }) => role))];
  const role = random.pick([...roles, ...roles.filter((one) => one !== 'prose' && one !== 'unit')]);
  const place = random.pick(places.filter((one) => one.role === role));
  const changed = CHANGES[role](place.text, random, names);
  return splice(text, place.start, place.end, random.chance(0.9) ? JSON.stringify(changed) : changed);
};

const CHANGES: Readonly<Record<Role, (text: string, random: Random, names: readonly string[]) => string>> = {
  formula: (text, random, names) =>
    random.weighted<() => string>([
      [5, () => dressed(random, text, names)],
      [3, () => expression(random, names, 4)],
      [2, () => otherName(text, random, names)],
      [1, () => `${text} to ${random.pick(UNITS)}`],
    ])(),
  comparison: (text, random, names) =>
    random.weighted<() => string>([
      [3, () => text.replace(/^[^<>]+/, (side) => `${dressed(random, side.trim(), names)} `)],
      [2, () => otherName(text, random, names)],
      [2, () => comparison(random, () => expression(random, names, 2))],
      [1, () => text.replace(/[<>]=?/, random.pick(['<', '<=', '>', '>=', '=', '<>', '< 1 <']))],
    ])(),
  quantity: (text, random) =>
    random.weighted<() => string>([
      [4, () => text.replace(/\d+(\.\d+)?/, (number) => nudged(number, random))],
      [3, () => text.replace(/\d+(\.\d+)?/, () => random.pick(EXTREMES))],
      [3, () => rangeOver(text, random)],
      [2, () => text.replace(/[A-Za-z%].*$/, random.pick(UNITS))],
      [1, () => `${text} ${text}`],
      [1, () => `${random.below(9)} ft ${random.below(30)}-${random.below(4)}/${random.below(4)} in`],
    ])(),
  unit: (_, random) => random.pick([...UNITS, 'gas', 'text', '1', '']),
  prose: (text, random, names) => {
    const at = random.below(text.length + 1);
    const scrap = random.pick([
      `{{ ${names.length > 0 ? random.pick(names) : 'x'} }}`, `{{ ${expression(random, names, 2)} }}`, '{{ }}', '{{', '}}',
      '$x$', '$\\frac{1}{$', '$$\\int$$', '$', '$\\href{javascript:x}{y}$', '<b>', '[a](javascript:x)', '![](x)', '`', '\n\n# x',
    ]); // prettier-ignore
    return splice(text, at, at, scrap);
  },
};

function otherName(text: string, random: Random, names: readonly string[]): string {
  const matches = [...text.matchAll(/[A-Za-z]\w*/g)];
  if (matches.length === 0 || names.length === 0) return text;
  const match = random.pick(matches);
  return splice(text, match.index, match.index + match[0].length, random.pick(names));
}

interface Reading {
  readonly places: readonly Place[];
  readonly names: readonly string[];
}

const readings = new Map<string, Reading>();

/** For the texts of the corpus, which come back thousands of times. */
function readOnce(text: string): Reading {
  const known = readings.get(text) ?? read(text);
  readings.set(text, known);
  return known;
}

function read(text: string): Reading {
  const document = parseDocument(text, { schema: 'core', uniqueKeys: false, merge: false, logLevel: 'silent' });
  const places: Place[] = [];
  const names = new Set<string>();
  visit(document, {
    Scalar: (position, scalar, path) => {
      const keys = path.filter(isPair).map(keyOf);
      if (position === 'key') {
        if (NAMED_UNDER.has(keys.at(-2) ?? '')) names.add(String(scalar.value));
      } else addPlace(places, scalar, keys);
    },
  });
  return { places, names: [...names] };
}

const NAMED_UNDER: ReadonlySet<string> = new Set(['inputs', 'steps', 'gases', 'take', 'tables', 'columns']);

function addPlace(places: Place[], scalar: Scalar, keys: readonly string[]): void {
  const role = ROLES.get(keys.at(-1) ?? '') ?? ROLES.get(keys.at(-2) ?? '');
  if (role === undefined || !scalar.range) return;
  places.push({ role, text: String(scalar.value), start: scalar.range[0], end: scalar.range[1] });
}

function keyOf(pair: Pair<unknown, unknown>): string {
  return isScalar(pair.key as Node) ? String((pair.key as Scalar).value) : '';
}
