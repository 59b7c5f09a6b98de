import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { checkNames } from './check-names.ts';
import type { SheetDocument } from './document.ts';
import { mergeDefinitions } from './merge-definitions.ts';
import { normalise } from './normalise.ts';
import { at, pairsOf } from './entries.ts';
import { nameBeside } from './file-names.ts';
import { ConditionsReader, type ReadFile } from './read-conditions.ts';
import { readYaml } from './read-yaml.ts';
import { schemaFaults, type DocumentKind } from './schema-faults.ts';

/**
 * YAML text to a checked document, every scalar with its place.
 *
 *   text ── limits, YAML, scalar traps ──▶ entries ── JSON Schema ──▶ ── normalise ──▶ document ── merge what it
 *        uses ──▶ ── names, sources ──▶
 *
 * Text that is no YAML stops here. A sheet that breaks the schema still gives a document of what could be read, so that
 * the faults of its formulas are found in the same run.
 *
 * @param file     name of the file, as diagnostics show it
 * @param readFile text of the files beside the sheet
 */
export function parseSheet(file: string, text: string, readFile: ReadFile = () => undefined): Diagnosed<SheetDocument> {
  const own = readDocument(file, text, 'sheet', readFile);
  if (own.value === undefined) return own;
  const diagnostics: Diagnostic[] = [...own.diagnostics];
  const used = own.value.use.flatMap((named) => {
    const name = nameBeside(file, named.text);
    const usedText = name === null ? undefined : readFile(name);
    if (name === null || usedText === undefined) {
      diagnostics.push(
        error('FILE_NOT_FOUND', named.span, `there is no file \`${named.text}\` beside the sheet`, {
          hints: ['name it as seen from the sheet, without `..`'],
        }),
      );
      return [];
    }
    const read = readDocument(name, usedText, 'definitions', readFile);
    diagnostics.push(...read.diagnostics);
    return read.value ?? [];
  });
  const merged = mergeDefinitions(own.value, used);
  return {
    value: merged.document,
    diagnostics: [...diagnostics, ...merged.diagnostics, ...checkNames(merged.document)],
  };
}

function readDocument(file: string, text: string, kind: DocumentKind, readFile: ReadFile): Diagnosed<SheetDocument> {
  const { root, diagnostics } = readYaml(file, text);
  if (root === null) return { diagnostics };
  if (root.entry !== 'map') {
    const span = { file, start: root.span.start, end: root.span.end };
    const what = kind === 'sheet' ? 'a sheet is' : 'definitions are';
    const fault = error('SCHEMA_TYPE', span, `${what} a mapping of keys to values`, {
      hints: [`begin with \`antinode: ${kind}/1\`; \`antinode new sheet FILE\` writes a starting point`],
    });
    return { diagnostics: [...diagnostics, fault] };
  }
  const reader = new ConditionsReader(file, readFile);
  const entry = at(root, 'conditions');
  const key = pairsOf(root).find((pair) => pair.key.text === 'conditions')?.key;
  const conditions = entry && key && reader.read(entry, key.span);
  const document = normalise(file, root, conditions);
  return { value: document, diagnostics: [...diagnostics, ...schemaFaults(root, kind), ...reader.diagnostics] };
}
