import type { ErrorObject } from 'ajv';
import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import { DEFINITIONS_SCHEMA, SHEET_SCHEMA } from './generated/sheet-schema.js';
import { validateDefinitions } from './generated/validate-definitions.js';
import { validateSheet } from './generated/validate-sheet.js';
import type { Entry, EntryPair } from './read-yaml.ts';
import type { SchemaNode } from './schema-node.ts';

/** Keys of the sheet language that this version does not know yet: said so, instead of offering a near miss. */
const LATER = ['machine', 'piping', 'analyses'];

/** A sheet, or a file of definitions that sheets use. */
export type DocumentKind = 'sheet' | 'definitions';

/** Holds a document against its JSON Schema; each fault in our own words, at the place where it stands. */
export function schemaFaults(root: Entry, kind: DocumentKind): Diagnostic[] {
  const validate = kind === 'sheet' ? validateSheet : validateDefinitions;
  if (validate(plainValue(root))) return [];
  const schema = kind === 'sheet' ? SHEET_SCHEMA : definitionsSchema();
  return (validate.errors ?? []).flatMap((fault) => describe(fault, root, schema) ?? []);
}

/** The words of a definition are those of the sheet's schema; only which keys may stand at the top differs. */
function definitionsSchema(): SchemaNode {
  const own = DEFINITIONS_SCHEMA.properties ?? {};
  const properties = Object.keys(own).map((key) => [
    key,
    (key === 'antinode' ? own : SHEET_SCHEMA.properties)?.[key] ?? {},
  ]);
  return { ...DEFINITIONS_SCHEMA, properties: Object.fromEntries(properties) as Record<string, SchemaNode> };
}

/** The data as the validator wants it. Objects have no prototype, so that no key of a sheet is one of JavaScript's own. */
function plainValue(entry: Entry): unknown {
  switch (entry.entry) {
    case 'scalar':
      return entry.value;
    case 'list':
      return entry.items.map(plainValue);
    case 'map': {
      const plain = Object.create(null) as Record<string, unknown>;
      for (const { key, value } of entry.pairs) plain[key.text] = plainValue(value);
      return plain;
    }
  }
}

interface Found {
  readonly entry: Entry;
  /** Place of the key under which the entry stands; of the entry itself in a list, or at the top. */
  readonly keySpan: Span;
  readonly schema: SchemaNode;
  readonly name: string;
}

function describe(fault: ErrorObject, root: Entry, schema: SchemaNode): Diagnostic | null {
  const found = follow(fault.instancePath, root, schema);
  switch (fault.keyword) {
    case 'additionalProperties':
      return unknownKey(String(fault.params['additionalProperty']), found);
    case 'propertyNames':
      return badName(String(fault.params['propertyName']), found);
    case 'required':
      return missingKey(String(fault.params['missingProperty']), found);
    case 'type':
      return wrongType(found);
    case 'pattern':
      // The pattern of a key's name is told by `propertyNames`; here it stands against the mapping.
      if (found.entry.entry !== 'scalar') return null;
      return valueFault(
        found,
        isBlank(found.entry) ? 'the text is blank' : `${shown(found.entry)} is not allowed here`,
      );
    case 'const':
    case 'enum':
      return notAllowed(found);
    case 'minItems':
    case 'minProperties':
      return error('SCHEMA_MISSING_KEY', found.keySpan, `\`${found.name}\` is empty`, { hints: example(found.schema) });
    default:
      return valueFault(found, `${shown(found.entry)} is not allowed here: it ${fault.message ?? 'does not fit'}`);
  }
}

function unknownKey(key: string, { entry, schema, name }: Found): Diagnostic {
  const known = Object.keys(schema.properties ?? {});
  const near = nearest(key, known, 2);
  // A comma inside braces begins the next key: the rest of a formula without quotes is taken for one.
  const hint = key.includes(')')
    ? 'a comma ends a value in braces: put a formula with commas between quotation marks'
    : LATER.includes(key)
      ? `\`${key}\` is not offered in this version`
      : near.length > 0
        ? `did you mean \`${near.join('`, `')}\`?`
        : `known here: ${known.join(', ')}`;
  const where = name === '' ? 'a sheet' : `\`${name}\``;
  return error(
    'SCHEMA_UNKNOWN_KEY',
    pairOf(entry, key)?.key.span ?? entry.span,
    `\`${key}\` is not a key of ${where}`,
    { hints: [hint] },
  );
}

function badName(key: string, { entry }: Found): Diagnostic {
  return error('SCHEMA_VALUE', pairOf(entry, key)?.key.span ?? entry.span, `\`${key}\` is not a name`, {
    hints: ['a name starts with a letter, and goes on with letters, digits and `_`'],
  });
}

function missingKey(key: string, { keySpan, schema, name }: Found): Diagnostic {
  const of = resolve(schema.properties?.[key] ?? {});
  const where = name === '' ? 'the sheet' : `\`${name}\``;
  const hints =
    of.examples?.[0] === undefined && of.const === undefined
      ? []
      : [`such as \`${key}: ${exampleText(of.const ?? of.examples?.[0])}\``];
  return error('SCHEMA_MISSING_KEY', keySpan, `${where} has no \`${key}\``, { hints });
}

function wrongType({ entry, schema, name, keySpan }: Found): Diagnostic | null {
  // A number that cannot be held has been reported as such where it was read.
  if (entry.entry === 'scalar' && typeof entry.value === 'number' && !Number.isFinite(entry.value)) return null;
  const isEmpty = entry.entry === 'scalar' && entry.value === null;
  const what = name === '' ? 'the sheet' : `\`${name}\``;
  if (isEmpty) return error('SCHEMA_TYPE', keySpan, `${what} is empty`, { hints: example(schema) });
  const message = `${typeWords(schema)} is wanted for ${what}, and ${shown(entry)} is given`;
  const isPlain = entry.entry === 'scalar' && typeof entry.value !== 'string';
  const wantsText = [schema.type].flat().includes('string');
  const hints =
    isPlain && wantsText ? [`put it in quotes if it is meant as text: \`"${entry.text.text}"\``] : example(schema);
  return error('SCHEMA_TYPE', firstLineOf(entry, keySpan), message, { hints });
}

/** A scalar is underlined itself; of a mapping or a list, whose text may be long, the key. */
function firstLineOf(entry: Entry, keySpan: Span): Span {
  return entry.entry === 'scalar' ? entry.span : keySpan;
}

function notAllowed({ entry, schema, keySpan }: Found): Diagnostic {
  const allowed = schema.enum ?? (schema.const === undefined ? [] : [schema.const]);
  const text = entry.entry === 'scalar' ? entry.text.text : '';
  const near = nearest(text, allowed);
  const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : `allowed: ${allowed.join(', ')}`;
  return error('SCHEMA_VALUE', firstLineOf(entry, keySpan), `${shown(entry)} is not allowed here`, { hints: [hint] });
}

function valueFault({ entry, schema, keySpan }: Found, message: string): Diagnostic {
  return error('SCHEMA_VALUE', firstLineOf(entry, keySpan), message, { hints: example(schema) });
}

/** Walks a JSON pointer down the entries, and the schema along with them. */
function follow(pointer: string, root: Entry, schema: SchemaNode): Found {
  const steps = pointer
    .split('/')
    .slice(1)
    .map((step) => step.replaceAll('~1', '/').replaceAll('~0', '~'));
  let found: Found = { entry: root, keySpan: { ...root.span, end: root.span.start }, schema, name: '' };
  for (const step of steps) found = inside(found, step) ?? found;
  return found;
}

function inside({ entry, schema, keySpan, name }: Found, step: string): Found | undefined {
  if (entry.entry === 'list') {
    const item = entry.items[Number(step)];
    // An item of a list has no key: its first key, or the item itself, shows where it is.
    const place = item?.entry === 'map' ? (item.pairs[0]?.key.span ?? keySpan) : (item?.span ?? keySpan);
    return (
      item && { entry: item, keySpan: place, schema: resolve(schema.items ?? {}), name: `${name} ${Number(step) + 1}` }
    );
  }
  const pair = pairOf(entry, step);
  const { additionalProperties } = schema;
  const below = schema.properties?.[step] ?? (typeof additionalProperties === 'object' ? additionalProperties : {});
  return pair && { entry: pair.value, keySpan: pair.key.span, schema: resolve(below), name: step };
}

function pairOf(entry: Entry, key: string): EntryPair | undefined {
  return entry.entry === 'map' ? entry.pairs.find((pair) => pair.key.text === key) : undefined;
}

/** A schema with its reference followed; its own words win over those of what it refers to. */
function resolve(schema: SchemaNode): SchemaNode {
  const name = schema.$ref?.replace('#/$defs/', '');
  const referred = name === undefined ? undefined : SHEET_SCHEMA.$defs?.[name];
  return referred === undefined ? schema : { ...resolve(referred), ...schema };
}

function typeWords({ type }: SchemaNode): string {
  const words: Readonly<Record<string, string>> = {
    string: 'text',
    number: 'a number',
    integer: 'a whole number',
    object: 'a mapping',
    array: 'a list',
  };
  return [type]
    .flat()
    .map((name) => words[name ?? ''] ?? 'a value')
    .join(' or ');
}

function shown(entry: Entry): string {
  switch (entry.entry) {
    case 'list':
      return 'a list';
    case 'map':
      return 'a mapping';
    case 'scalar':
      return `\`${entry.text.text.length > 40 ? `${entry.text.text.slice(0, 40)}…` : entry.text.text}\``;
  }
}

function isBlank(entry: Entry): boolean {
  return entry.entry === 'scalar' && entry.text.text.trim() === '';
}

function example({ examples, const: only }: SchemaNode): string[] {
  const given = only ?? examples?.[0];
  return given === undefined ? [] : [`such as \`${exampleText(given)}\``];
}

function exampleText(value: unknown): string {
  return typeof value === 'string' ? value : JSON.stringify(value);
}
