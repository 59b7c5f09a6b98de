/**
 * Compiles the JSON Schemas to plain validator modules, so that no host compiles a schema when it runs: that would take
 * time at every start, and `eval`, which the browser's security policy forbids. Files that have not changed are left alone.
 */
import { createHash } from 'node:crypto';
import { mkdir, readdir, readFile, writeFile } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import type { AnySchemaObject } from 'ajv/dist/2020.js';
import type * as standalone from 'ajv/dist/standalone/index.js';
import type * as formats from 'ajv-formats';
import type { Plugin } from 'esbuild';

const root = join(import.meta.dirname, '..');
const SUFFIX = '.schema.json';
const HEADER = '// Made from the JSON Schemas by .build/schemas.ts; do not edit.';

/** One validator module: `name` is the function it exports, `type` what the function narrows to. */
interface Target {
  readonly schema: AnySchemaObject;
  readonly name: string;
  /** Path without suffix, from the project root. */
  readonly module: string;
  readonly type?: { readonly name: string; readonly from: string };
}

export async function compileSchemas(): Promise<void> {
  const [sheet, definitions, report, manifest, bundle] = await Promise.all(
    ['sheet', 'definitions', 'report', 'manifest', 'bundle'].map((name) => readSchema(join('schemas', name + SUFFIX))),
  );
  if (!sheet || !definitions || !report || !manifest || !bundle) throw new Error('a schema is missing');
  const targets: Target[] = [
    { schema: sheet, name: 'validateSheet', module: 'core/sheet/generated/validate-sheet' },
    {
      schema: definitions,
      name: 'validateDefinitions',
      module: 'core/sheet/generated/validate-definitions',
    },
    {
      schema: report,
      name: 'validateReport',
      module: 'core/report/generated/validate-report',
      type: { name: 'Report', from: '../model.ts' },
    },
    {
      schema: bundle,
      name: 'validateBundle',
      module: 'core/seal/generated/validate-bundle',
      type: { name: 'Bundle', from: '../model.ts' },
    },
    ...(await apiTargets()),
  ];
  const shared = [sheet, definitions, report, manifest, bundle];
  const key = await keyOf([...shared, ...targets.map((target) => target.schema)]);
  const current = await Promise.all(targets.map((target) => isCurrent(target, key)));
  await Promise.all([
    writeSheetSchema(sheet, definitions),
    ...targets.filter((_, index) => !current[index]).map((target) => compile(target, shared, key)),
  ]);
}

/** Digest of all that decides what the modules hold; it stands in their first line. */
async function keyOf(schemas: readonly AnySchemaObject[]): Promise<string> {
  const makers = [import.meta.filename, join(root, 'node_modules/ajv/package.json')];
  const texts = await Promise.all(makers.map((file) => readFile(file, 'utf8')));
  return createHash('sha256')
    .update(JSON.stringify([schemas, texts]))
    .digest('hex');
}

async function isCurrent({ module }: Target, key: string): Promise<boolean> {
  const texts = await Promise.all(
    ['.js', '.d.ts'].map((suffix) => readFile(join(root, module + suffix), 'utf8').catch(() => '')),
  );
  return texts.every((text) => text.startsWith(firstLine(key)));
}

function firstLine(key: string): string {
  return `${HEADER} ${key}\n`;
}

/** `schemas/api/sign-in.schema.json` becomes `schemas/generated/sign-in.js`, which exports `validateSignIn`. */
async function apiTargets(): Promise<Target[]> {
  const folder = join('schemas', 'api');
  const files = await readdir(join(root, folder)).catch(() => []);
  const types = await readFile(join(root, 'schemas', 'api.ts'), 'utf8');
  return Promise.all(
    files
      .filter((file) => file.endsWith(SUFFIX))
      .sort()
      .map(async (file): Promise<Target> => {
        const name = basename(file, SUFFIX);
        const pascal = name.replace(/(?:^|-)([a-z])/g, (_, letter: string) => letter.toUpperCase());
        const target = {
          schema: await readSchema(join(folder, file)),
          name: `validate${pascal}`,
          module: `schemas/generated/${name}`,
        };
        const isTyped = new RegExp(`export (?:interface|type) ${pascal}\\b`).test(types);
        return isTyped ? { ...target, type: { name: pascal, from: '../api.ts' } } : target;
      }),
  );
}

async function readSchema(path: string): Promise<AnySchemaObject> {
  return JSON.parse(await readFile(join(root, path), 'utf8')) as AnySchemaObject;
}

/** The schemas of sheets and definitions as data: the words of its diagnostics (known keys, examples) come from it. */
async function writeSheetSchema(sheet: AnySchemaObject, definitions: AnySchemaObject): Promise<void> {
  const module = 'core/sheet/generated/sheet-schema';
  await Promise.all([
    writeIfChanged(
      `${module}.js`,
      `${HEADER}\nexport const SHEET_SCHEMA = ${JSON.stringify(sheet)};\nexport const DEFINITIONS_SCHEMA = ${JSON.stringify(definitions)};\n`,
    ),
    writeIfChanged(
      `${module}.d.ts`,
      `${HEADER}\nimport type { SchemaNode } from '../schema-node.ts';\n\nexport declare const SHEET_SCHEMA: SchemaNode;\nexport declare const DEFINITIONS_SCHEMA: SchemaNode;\n`,
    ),
  ]);
}

async function compile(target: Target, shared: readonly AnySchemaObject[], key: string): Promise<void> {
  // Loaded only when there is something to compile: most runs find everything current.
  const [{ Ajv2020 }, standaloneCode, addFormats] = await Promise.all([
    import('ajv/dist/2020.js'),
    importDefault<typeof standalone.default>('ajv/dist/standalone/index.js'),
    importDefault<typeof formats.default>('ajv-formats'),
  ]);
  const ajv = new Ajv2020({
    allErrors: true,
    strict: true,
    allowUnionTypes: true,
    inlineRefs: 3,
    code: { esm: true, source: true },
    schemas: [...new Set([...shared, target.schema])],
  });
  addFormats(ajv);
  const id: unknown = target.schema['$id'];
  if (typeof id !== 'string') throw new Error(`the schema of ${target.module} has no $id`);
  const code = standaloneCode(ajv, { [target.name]: id });
  await Promise.all([
    writeIfChanged(`${target.module}.js`, firstLine(key) + (await selfContained(code))),
    writeIfChanged(`${target.module}.d.ts`, firstLine(key) + declaration(target)),
  ]);
}

/** These packages are CommonJS: Node and the bundlers disagree on how deep their default export lies. */
async function importDefault<T>(name: string): Promise<T> {
  let found: unknown = await import(name);
  while (typeof found === 'object' && found !== null && 'default' in found) found = found.default;
  return found as T;
}

/** The validator with the few helpers that ajv's code requires at run time put in. */
async function selfContained(code: string): Promise<string> {
  const { build } = await import('esbuild');
  const result = await build({
    stdin: { contents: code, resolveDir: root, loader: 'js' },
    bundle: true,
    write: false,
    format: 'esm',
    platform: 'neutral',
    mainFields: ['main'],
    target: 'es2022',
    minifySyntax: true,
    minifyWhitespace: true,
    plugins: [withoutRequireText],
  });
  return result.outputFiles[0]?.text ?? '';
}

/** ajv's helpers carry, as text for its own generator, the statement that loads them: of no use in a finished module. */
const withoutRequireText: Plugin = {
  name: 'without-require-text',
  setup(build) {
    build.onLoad({ filter: /ajv[\\/]dist[\\/]runtime[\\/]\w+\.js$/ }, async ({ path }) => {
      const text = await readFile(path, 'utf8');
      return { contents: text.replace(/^\w+\.code = .*$/m, ''), loader: 'js' };
    });
  },
};

function declaration({ name, type }: Target): string {
  const lines = ["import type { ErrorObject } from 'ajv';"];
  if (type) lines.push(`import type { ${type.name} } from '${type.from}';`);
  const result = type ? `data is ${type.name}` : 'boolean';
  lines.push(
    '',
    `export declare const ${name}: {`,
    `  (data: unknown): ${result};`,
    '  /** What is wrong with the data of the last call. */',
    '  readonly errors?: readonly ErrorObject[] | null;',
    '};',
  );
  return lines.join('\n') + '\n';
}

async function writeIfChanged(path: string, text: string): Promise<void> {
  const file = join(root, path);
  const before = await readFile(file, 'utf8').catch(() => undefined);
  if (before === text) return;
  await mkdir(dirname(file), { recursive: true });
  await writeFile(file, text);
}

if (process.argv[1] === import.meta.filename) await compileSchemas();
