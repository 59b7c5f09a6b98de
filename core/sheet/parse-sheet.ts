import { error, type Diagnosed } from '../diagnostics/diagnostic.ts';
import { checkNames } from './check-names.ts';
import type { SheetDocument } from './document.ts';
import { normalise } from './normalise.ts';
import { readYaml } from './read-yaml.ts';
import { schemaFaults } from './schema-faults.ts';

/**
 * YAML text to a checked document, every scalar with its place.
 *
 *   text ── limits, YAML, scalar traps ──▶ entries ── JSON Schema ──▶ ── normalise ──▶ document ── names, sources ──▶
 *
 * Text that is no YAML stops here. A sheet that breaks the schema still gives a document of what could be read, so that
 * the faults of its formulas are found in the same run.
 *
 * @param file name of the file, as diagnostics show it
 */
export function parseSheet(file: string, text: string): Diagnosed<SheetDocument> {
  const { root, diagnostics } = readYaml(file, text);
  if (root === null) return { diagnostics };
  if (root.entry !== 'map') {
    const span = { file, start: root.span.start, end: root.span.end };
    const fault = error('SCHEMA_TYPE', span, 'a sheet is a mapping of keys to values', {
      hints: ['begin with `antinode: sheet/1`; `antinode new sheet FILE` writes a starting point'],
    });
    return { diagnostics: [...diagnostics, fault] };
  }
  const document = normalise(file, root);
  return { value: document, diagnostics: [...diagnostics, ...schemaFaults(root), ...checkNames(document)] };
}
