import type {
  Annotations,
  CheckNode,
  GasNode,
  InputNode,
  SectionNode,
  SheetDocument,
  StepNode,
  Text,
} from './document.ts';
import type { Entry, EntryPair } from './read-yaml.ts';

/**
 * Brings the entries into the one explicit form of a sheet. Where the schema has found fault, what cannot be read is left
 * out; the names of inputs and steps that are left out stay known, so that formulas which use them are not blamed.
 */
export function normalise(file: string, root: Entry): SheetDocument {
  const unread: Text[] = [];
  const nothing: Text = { text: '', span: { file, start: 0, end: 0 } };
  const atmosphere = textAt(root, 'atmosphere');
  return {
    file,
    number: textAt(root, 'number') ?? nothing,
    title: textAt(root, 'title') ?? nothing,
    units: textAt(root, 'units')?.text === 'si' ? 'si' : 'us',
    ...(atmosphere === undefined ? {} : { atmosphere }),
    sources: pairsOf(at(root, 'sources')).flatMap(({ key, value }) => withText(value, (text) => ({ id: key, text }))),
    assumptions: itemsOf(at(root, 'assumptions')).flatMap((item) => withText(item, (text) => text)),
    gases: pairsOf(at(root, 'gases')).map(gas),
    inputs: pairsOf(at(root, 'inputs')).flatMap((pair) => keep(input(pair), pair.key, unread)),
    sections: itemsOf(at(root, 'sections')).map((item) => section(item, unread, nothing)),
    unread,
  };
}

/** An input or a step that could be read; else its name goes to those that could not. */
function keep<T>(node: T | undefined, name: Text, unread: Text[]): T[] {
  if (node !== undefined) return [node];
  unread.push(name);
  return [];
}

function gas({ key, value }: EntryPair): GasNode {
  const [method, source, note] = [textAt(value, 'method'), textAt(value, 'source'), textAt(value, 'note')];
  return {
    name: key,
    ...(method === undefined ? {} : { method }),
    ...(source === undefined ? {} : { source }),
    ...(note === undefined ? {} : { note }),
    fractions: pairsOf(at(value, 'fractions')).flatMap((pair) =>
      withText(pair.value, (amount) => ({ component: pair.key, amount })),
    ),
  };
}

function input({ key, value }: EntryPair): InputNode | undefined {
  const typed = value.entry === 'scalar' ? textOf(value) : textAt(value, 'value');
  const hold = textAt(value, 'hold');
  return typed && { name: key, value: typed, ...(hold === undefined ? {} : { hold }), ...annotations(value) };
}

function section(item: Entry, unread: Text[], nothing: Text): SectionNode {
  const text = textAt(item, 'text');
  return {
    title: textAt(item, 'title') ?? nothing,
    ...(text === undefined ? {} : { text }),
    steps: pairsOf(at(item, 'steps')).flatMap((pair) => keep(step(pair), pair.key, unread)),
    checks: itemsOf(at(item, 'checks')).flatMap((entry) => check(entry) ?? []),
  };
}

function step({ key, value }: EntryPair): StepNode | undefined {
  const calc = value.entry === 'scalar' ? textOf(value) : textAt(value, 'calc');
  const unit = textAt(value, 'unit');
  return calc && { name: key, calc, ...(unit === undefined ? {} : { unit }), ...annotations(value) };
}

function check(entry: Entry): CheckNode | undefined {
  const that = textAt(entry, 'that');
  return that && { that, ...annotations(entry) };
}

function annotations(entry: Entry): Annotations {
  const [label, symbol, note, source] = ['label', 'symbol', 'note', 'source'].map((key) => textAt(entry, key));
  const digits = at(entry, 'digits');
  return {
    ...(label === undefined ? {} : { label }),
    ...(symbol === undefined ? {} : { symbol }),
    ...(note === undefined ? {} : { note }),
    ...(source === undefined ? {} : { source }),
    ...(digits?.entry === 'scalar' && typeof digits.value === 'number' ? { digits: digits.value } : {}),
  };
}

function at(entry: Entry, key: string): Entry | undefined {
  return pairsOf(entry).find((pair) => pair.key.text === key)?.value;
}

function textAt(entry: Entry, key: string): Text | undefined {
  const found = at(entry, key);
  return found && textOf(found);
}

/** Text and numbers as they are written; an empty value, a truth value, a list or a mapping is none. */
function textOf(entry: Entry): Text | undefined {
  if (entry.entry !== 'scalar' || entry.value === null || typeof entry.value === 'boolean') return undefined;
  return typeof entry.value === 'number' && !Number.isFinite(entry.value) ? undefined : entry.text;
}

function withText<T>(entry: Entry, make: (text: Text) => T): T[] {
  const text = textOf(entry);
  return text === undefined ? [] : [make(text)];
}

function pairsOf(entry: Entry | undefined): readonly EntryPair[] {
  return entry?.entry === 'map' ? entry.pairs : [];
}

function itemsOf(entry: Entry | undefined): readonly Entry[] {
  return entry?.entry === 'list' ? entry.items : [];
}
