import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Ajv2020 } from 'ajv/dist/2020.js';
import { describe, expect, it } from 'vitest';
import { SHEET_TEMPLATE } from '../../../cli/templates/sheet.ts';
import { evaluateSheet } from '../../../core/evaluate/evaluate-sheet.ts';

interface Node {
  readonly $id?: string;
  readonly $ref?: string;
  readonly $defs?: Readonly<Record<string, Node>>;
  readonly title?: string;
  readonly description?: string;
  readonly examples?: readonly unknown[];
  readonly properties?: Readonly<Record<string, Node>>;
  readonly additionalProperties?: boolean | Node;
  readonly items?: Node;
}

const ROOT = join(import.meta.dirname, '../../..');

function schema(name: string): Node {
  return JSON.parse(readFileSync(join(ROOT, 'schemas', `${name}.schema.json`), 'utf8')) as Node;
}

const SHEET = schema('sheet');
const DEFINITIONS = schema('definitions');
const ajv = new Ajv2020({ strict: true, allowUnionTypes: true, schemas: [SHEET, DEFINITIONS] });

/** A schema with what it refers to put under its own words. */
function resolved(node: Node): Node {
  const name = node.$ref?.replace(/^(?:sheet\.schema\.json)?#\/(?:\$defs|properties)\//, '');
  if (name === undefined) return node;
  const referred = SHEET.$defs?.[name] ?? SHEET.properties?.[name];
  return referred === undefined ? node : { ...resolved(referred), ...node };
}

/** Everything that an editor completes or explains: each key, each item of a list, each value of a mapping. */
function* nodes(node: Node, pointer: string): Generator<readonly [pointer: string, node: Node]> {
  yield [pointer, node];
  for (const [key, child] of Object.entries(node.properties ?? {})) yield* nodes(child, `${pointer}/properties/${key}`);
  for (const [key, child] of Object.entries(node.$defs ?? {})) yield* nodes(child, `${pointer}/$defs/${key}`);
  if (typeof node.additionalProperties === 'object')
    yield* nodes(node.additionalProperties, `${pointer}/additionalProperties`);
  if (node.items !== undefined) yield* nodes(node.items, `${pointer}/items`);
}

/** Base types that only other definitions refer to, each with words of its own. */
const BASE = new Set(['#/$defs/text', '#/$defs/name', '#/$defs/id']);

const DOCUMENTED = [...nodes(SHEET, '#')].filter(([pointer]) => pointer !== '#' && !BASE.has(pointer));

describe('the schema of a sheet, as editors read it', () => {
  it.each(DOCUMENTED)('%s has a title, a description and an example', (_, node) => {
    const { title = '', description = '', examples = [] } = resolved(node);
    expect(title).toMatch(/^[A-Z]/);
    expect(description.length).toBeGreaterThan(8);
    expect(examples.length).toBeGreaterThan(0);
  });

  it.each(DOCUMENTED)('every example of %s is valid', (pointer, node) => {
    const validate = ajv.compile({ $ref: `${SHEET.$id ?? ''}${pointer}` });
    for (const example of resolved(node).examples ?? []) {
      expect(validate(example), `${JSON.stringify(example)}: ${JSON.stringify(validate.errors)}`).toBe(true);
    }
  });

  it('of definitions takes its words from that of a sheet', () => {
    for (const [key, node] of Object.entries(DEFINITIONS.properties ?? {})) {
      expect(resolved(node).description, key).toBeTruthy();
    }
  });
});

describe('the yaml in the README', () => {
  const readme = readFileSync(join(ROOT, 'README.md'), 'utf8');
  const blocks = [...readme.matchAll(/```yaml\n([^]*?)```/g)].map((match) => match[1] ?? '');

  it('is there', () => {
    expect(blocks.length).toBeGreaterThan(3);
  });

  it.each(blocks)('is what a sheet takes: %#', (block) => {
    // A block shows part of a sheet: it is put under the head of the template, in the place of the template's own parts.
    const keys = [...block.matchAll(/^([a-z_]+):/gm)].map((match) => match[1] ?? '');
    const head = SHEET_TEMPLATE.split(/\n(?=[a-z_#])/)
      .filter((part) => !part.startsWith('#') && !keys.some((key) => part.startsWith(`${key}:`)))
      .filter((part) => keys.includes('sections') || !part.startsWith('sections:'));
    const text = `${head.join('\n')}\n${block}`;
    const files = [
      { name: 'sheet.yaml', text },
      { name: 'basis.yaml', text: 'antinode: definitions/1' },
    ];
    const { diagnostics } = evaluateSheet({ entry: 'sheet.yaml', files });
    const wrong = diagnostics.filter(({ code }) =>
      /^(?:SCHEMA|YAML|EXPRESSION|QUANTITY|UNIT|CONDITIONS|AXIS)/.test(code),
    );
    expect(wrong.map(({ message, line }) => `${line}: ${message}`)).toEqual([]);
  });
});
