import { annotations } from './annotations.ts';
import type {
  CheckNode,
  ConditionsNode,
  FigureNode,
  GasNode,
  InputNode,
  LookupNode,
  SectionNode,
  SheetDocument,
  StepNode,
  TableNode,
  TakeNode,
  Text,
} from './document.ts';
import { at, itemsOf, pairsOf, textAt, textOf, textsOf } from './entries.ts';
import type { Entry, EntryPair } from './read-yaml.ts';

/**
 * Brings the entries into the one explicit form of a sheet. Where the schema has found fault, what cannot be read is left
 * out; the names of inputs and steps that are left out stay known, so that formulas which use them are not blamed.
 *
 * @param conditions the operating conditions, which may stand in a file of their own
 */
export function normalise(file: string, root: Entry, conditions: ConditionsNode | undefined): SheetDocument {
  const unread: Text[] = [];
  const nothing: Text = { text: '', span: { file, start: 0, end: 0 } };
  return {
    file,
    number: textAt(root, 'number') ?? nothing,
    title: textAt(root, 'title') ?? nothing,
    units: textAt(root, 'units')?.text === 'si' ? 'si' : 'us',
    ...optional('atmosphere', textAt(root, 'atmosphere')),
    ...optional('normal', textAt(root, 'normal_state')),
    ...optional('standard', textAt(root, 'standard_state')),
    use: textsOf(at(root, 'use')),
    take: pairsOf(at(root, 'take')).flatMap((pair) => keep(taken(pair), pair.key, unread)),
    sources: pairsOf(at(root, 'sources')).flatMap(({ key, value }) => withText(value, (text) => ({ id: key, text }))),
    assumptions: textsOf(at(root, 'assumptions')),
    exclusions: textsOf(at(root, 'exclusions')),
    references: textsOf(at(root, 'references')),
    ...optional('conditions', conditions),
    lookups: pairsOf(at(root, 'tables')).map(lookup),
    gases: pairsOf(at(root, 'gases')).map(gas),
    inputs: pairsOf(at(root, 'inputs')).flatMap((pair) => keep(input(pair), pair.key, unread)),
    sections: itemsOf(at(root, 'sections')).map((item) => section(item, unread, nothing)),
    unread,
  };
}

/** A property where it has a value, and no property where it has none. */
function optional<K extends string, T>(key: K, value: T | undefined): Partial<Record<K, T>> {
  return value === undefined ? {} : ({ [key]: value } as Record<K, T>);
}

/** An input or a step that could be read; else its name goes to those that could not. */
function keep<T>(node: T | undefined, name: Text, unread: Text[]): T[] {
  if (node !== undefined) return [node];
  unread.push(name);
  return [];
}

function taken({ key, value }: EntryPair): TakeNode | undefined {
  const from = value.entry === 'scalar' ? textOf(value) : textAt(value, 'from');
  return from && { name: key, from, ...annotations(value) };
}

function lookup({ key, value }: EntryPair): LookupNode {
  return {
    name: key,
    ...annotations(value),
    columns: pairsOf(at(value, 'columns')).flatMap((pair) =>
      withText(pair.value, (unit) => ({ name: pair.key, unit })),
    ),
    rows: itemsOf(at(value, 'rows')).map(textsOf),
  };
}

function gas({ key, value }: EntryPair): GasNode {
  return {
    name: key,
    ...optional('method', textAt(value, 'method')),
    ...optional('source', textAt(value, 'source')),
    ...optional('note', textAt(value, 'note')),
    fractions: shares(at(value, 'fractions')),
    tolerance: shares(at(value, 'tolerance')),
  };
}

function shares(entry: Entry | undefined): { component: Text; amount: Text }[] {
  return pairsOf(entry).flatMap(({ key, value }) => withText(value, (amount) => ({ component: key, amount })));
}

function input({ key, value }: EntryPair): InputNode | undefined {
  const typed = value.entry === 'scalar' ? textOf(value) : textAt(value, 'value');
  const [least, greatest] = textsOf(at(value, 'range'));
  return (
    typed && {
      name: key,
      value: typed,
      ...optional('hold', textAt(value, 'hold')),
      ...optional('tolerance', textAt(value, 'tolerance')),
      ...(least === undefined || greatest === undefined ? {} : { range: [least, greatest] as const }),
      ...optional('expect', textAt(value, 'expect')),
      ...annotations(value),
    }
  );
}

function section(item: Entry, unread: Text[], nothing: Text): SectionNode {
  return {
    title: textAt(item, 'title') ?? nothing,
    ...optional('text', textAt(item, 'text')),
    steps: pairsOf(at(item, 'steps')).flatMap((pair) => keep(step(pair), pair.key, unread)),
    checks: itemsOf(at(item, 'checks')).flatMap((entry) => check(entry) ?? []),
    tables: itemsOf(at(item, 'tables')).map(table),
    figures: itemsOf(at(item, 'figures')).flatMap((entry) => figure(entry) ?? []),
  };
}

function step({ key, value }: EntryPair): StepNode | undefined {
  const calc = value.entry === 'scalar' ? textOf(value) : textAt(value, 'calc');
  return (
    calc && {
      name: key,
      calc,
      ...optional('unit', textAt(value, 'unit')),
      ...optional('expect', textAt(value, 'expect')),
      ...annotations(value),
    }
  );
}

function check(entry: Entry): CheckNode | undefined {
  const that = textAt(entry, 'that');
  return that && { that, ...annotations(entry) };
}

function table(entry: Entry): TableNode {
  return {
    of: textsOf(at(entry, 'of')),
    ...optional('title', textAt(entry, 'title')),
    ...optional('note', textAt(entry, 'note')),
  };
}

function figure(entry: Entry): FigureNode | undefined {
  const [kind, of] = [textAt(entry, 'kind'), textAt(entry, 'of')];
  if (kind === undefined || of === undefined) return undefined;
  return {
    kind,
    of,
    ...optional('limit', textAt(entry, 'limit')),
    ...optional('unit', textAt(entry, 'unit')),
    ...optional('title', textAt(entry, 'title')),
    ...optional('note', textAt(entry, 'note')),
  };
}

function withText<T>(entry: Entry, make: (text: Text) => T): T[] {
  const text = textOf(entry);
  return text === undefined ? [] : [make(text)];
}
