import { onlyValue } from '../axes/column.ts';
import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { TableColumn } from '../expression/lookup-table.ts';
import type { EvaluatedLookup } from '../report/evaluated-sheet.ts';
import type { LookupNode, SheetDocument, Text } from '../sheet/document.ts';
import { parseUnit } from '../units/parse-unit.ts';
import type { Site } from '../units/site.ts';
import { typeOfUnit } from '../units/unit.ts';
import { unknownUnit } from '../units/unknown-unit.ts';
import { isSameKind, readValue } from './read-values.ts';

export interface Lookups {
  readonly lookups: readonly EvaluatedLookup[];
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads the tables that formulas interpolate in. */
export function readLookups({ lookups }: SheetDocument, site: Site): Lookups {
  const read = lookups.map((node) => readLookup(node, site));
  return {
    lookups: read.flatMap(({ lookup }) => lookup ?? []),
    diagnostics: read.flatMap(({ diagnostics }) => diagnostics),
  };
}

function readLookup(node: LookupNode, site: Site): { lookup?: EvaluatedLookup; diagnostics: readonly Diagnostic[] } {
  const diagnostics: Diagnostic[] = [];
  const [x, y] = node.columns.map(({ unit }, i) => readColumn(node, unit, i, site, diagnostics));
  if (x === undefined || y === undefined || diagnostics.length > 0) return { diagnostics };
  const falls = x.values.findIndex((value, i) => i > 0 && !(value > (x.values[i - 1] ?? Number.NaN)));
  if (falls !== -1) {
    const at = node.rows[falls]?.[0] ?? node.name;
    const fault = error('LOOKUP_ORDER', at.span, `the first column of \`${node.name.text}\` does not rise here`, {
      hints: ['sort the rows by their first column; no value stands in it twice'],
    });
    return { diagnostics: [fault] };
  }
  return { lookup: { node, table: { name: node.name.text, x, y, site } }, diagnostics };
}

function readColumn(
  node: LookupNode,
  unitText: Text,
  index: number,
  site: Site,
  diagnostics: Diagnostic[],
): TableColumn | undefined {
  const unit = parseUnit(unitText.text);
  if (unit === null) {
    diagnostics.push(unknownUnit(unitText.text, unitText.span));
    return undefined;
  }
  const values = node.rows.map((row) => {
    const cell = row[index];
    if (cell === undefined) return Number.NaN;
    const isBare = /^[-+−]?[\d./eE+-]+$/.test(cell.text.trim());
    const text = isBare && unit.text !== '1' ? `${cell.text.trim()} ${unit.text}` : cell.text;
    const read = readValue({ text, span: cell.span }, site, undefined);
    diagnostics.push(...read.diagnostics.map((fault) => ({ ...fault, span: cell.span })));
    if (read.value === undefined) return Number.NaN;
    if (!isSameKind(read.value.type, unit)) {
      diagnostics.push(
        error('UNIT_MISMATCH', cell.span, `the column is in \`${unit.text}\`, and this cell is not of its kind`),
      );
    }
    return onlyValue(read.value.column);
  });
  return { type: typeOfUnit(unit), values: Float64Array.from(values), unit };
}
