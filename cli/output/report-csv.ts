import type { Nested } from '../../core/axes/column.ts';
import type { Quantity, Report, ReportAxis } from '../../core/report/model.ts';
import { harmlessText } from './harmless.ts';

type Cell = string | number;

/**
 * All quantities as comma-separated values (RFC 4180), tidy: one row for each quantity and point, a column for each axis
 * that the sheet has. Numbers have their full precision.
 */
export function reportCsv({ axes, quantities }: Report): string {
  const head = ['name', 'label', ...axes.map(axisHead), 'value', 'unit', 'si'];
  const rows = Object.entries(quantities).flatMap(([name, quantity]) => quantityRows(name, quantity, axes));
  return [head, ...rows].map((row) => `${row.map(cellText).join(',')}\r\n`).join('');
}

function axisHead({ name, unit }: ReportAxis): string {
  return unit === undefined ? name : `${name} [${unit}]`;
}

function quantityRows(name: string, quantity: Quantity, axes: readonly ReportAxis[]): Cell[][] {
  const { label, value, unit, si } = quantity;
  const rows: Cell[][] = [];
  const walk = (values: Nested, sis: Nested, point: ReadonlyMap<string, Cell>): void => {
    if (typeof values === 'number' || typeof sis === 'number') {
      if (typeof values !== 'number' || typeof sis !== 'number')
        throw new Error(`values and SI values of ${name} differ`);
      rows.push([name, label, ...axes.map((axis) => point.get(axis.name) ?? ''), values, unit, sis]);
      return;
    }
    const axis = quantity.axes[point.size];
    values.forEach((part, i) => {
      if (axis !== undefined) walk(part, sis[i] ?? Number.NaN, new Map([...point, [axis.name, axis.values[i] ?? '']]));
    });
  };
  walk(value, si, new Map());
  return rows;
}

/** Spreadsheets compute what begins with one of these. A number may begin with a minus sign; it is not text. */
const FORMULA_START = /^[=+\-@]/;
const NEEDS_QUOTES = /[",\r\n]/;

function cellText(cell: Cell): string {
  if (typeof cell === 'number') return String(cell);
  const shown = harmlessText(cell);
  const text = FORMULA_START.test(shown) ? `'${shown}` : shown;
  return NEEDS_QUOTES.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
