import type { FigureBlock, ReportAxis, TableBlock } from '../../../core/report/model.ts';
import { printNumber } from '../../../core/units/print.ts';
import type { Paint } from '../../terminal.ts';
import { gridLines, type GridColumn } from './grid.ts';
import { type Detail, detailLines, INDENT, noteLines, plain, spaced } from './layout.ts';
import { cutAfter, moreLine, thinned } from './thin.ts';

/** More than this no one reads in a terminal; the other forms have all. */
const MOST_ROWS = 24;
const MOST_COLUMNS = 8;

/** What a table without a title of its own is called. */
const UNTITLED = 'Table';

export function tableLines(blocks: readonly TableBlock[], paint: Paint): string[] {
  return spaced(
    blocks.map((block) => {
      const rows = cutAfter(block.rows, MOST_ROWS);
      const lead: GridColumn = { head: ['', ''], cells: rows.map(({ at }) => at), align: 'left' };
      const columns = block.columns.map(({ name, unit }, i): GridColumn => ({
        head: [name, unit],
        cells: rows.map(({ cells }) => cells[i] ?? ''),
        align: 'right',
      }));
      return [
        ...(block.label === UNTITLED ? [] : [`${INDENT}${paint('bold', block.label)}`]),
        ...noteLines(block, paint),
        ...gridLines(lead, columns, paint),
        ...moreLine(block.rows.length, MOST_ROWS, paint),
      ];
    }),
  );
}

/** What a figure draws, as numbers: the points of `x` down the page, a column for each series and one for the limit. */
export function figureLines(blocks: readonly FigureBlock[], paint: Paint): string[] {
  return spaced(
    blocks.map((block) => [
      `${INDENT}${paint('bold', block.label)}${paint('dim', `  ${kindText(block)}`)}`,
      ...noteLines(block, paint),
      ...(block.kind === 'matrix' ? matrixLines(block, paint) : seriesLines(block, paint)),
      ...detailLines([greatestDetail(block)], (text) => paint('dim', text)),
    ]),
  );
}

function kindText({ kind, unit }: FigureBlock): string {
  return unit === '' ? kind : `${kind}, in ${unit}`;
}

function greatestDetail({ greatest }: FigureBlock): Detail {
  return [`greatest ${plain(greatest.printed)}`, ...(greatest.at === '' ? [] : [`at ${greatest.at}`])];
}

function seriesLines({ x, series, limit, unit }: FigureBlock, paint: Paint): string[] {
  const peak = greatestOf(series);
  const rows = thinned(x.values.length, MOST_ROWS, peak.point);
  const lines = thinned(series.length, MOST_COLUMNS, peak.series);
  const shown = lines.map((line): GridColumn => {
    const { label, values } = series[line] ?? { label: '', values: [] };
    return { head: [label === '' ? unit : label], cells: rows.map((row) => cell(values[row])), align: 'right' };
  });
  const limits = limit === undefined ? [] : [limitColumn(limit.values, rows)];
  return [
    ...gridLines(pointColumn(x, rows), [...shown, ...limits], paint),
    ...leftOutLine(rows.length, x.values.length, lines.length, series.length, paint),
  ];
}

/** A matrix as it is drawn: its second axis down the page, `x` across. */
function matrixLines({ x, series, limit }: FigureBlock, paint: Paint): string[] {
  const peak = greatestOf(series);
  const rows = thinned(series.length, MOST_ROWS, peak.series);
  const across = thinned(x.values.length, MOST_COLUMNS, peak.point);
  const limits = limit === undefined ? [] : ['limit'];
  const lead: GridColumn = {
    head: [axisHead(x)],
    cells: [...rows.map((row) => series[row]?.label ?? ''), ...limits],
    align: 'left',
  };
  const columns = across.map((point): GridColumn => {
    const limitCell = limit === undefined ? [] : [cell(limit.values[point] ?? limit.values[0])];
    return {
      head: [String(x.values[point] ?? '')],
      cells: [...rows.map((row) => cell(series[row]?.values[point])), ...limitCell],
      align: 'right',
    };
  });
  return [
    ...gridLines(lead, columns, paint),
    ...leftOutLine(rows.length, series.length, across.length, x.values.length, paint),
  ];
}

function pointColumn(x: ReportAxis, rows: readonly number[]): GridColumn {
  return {
    head: [axisHead(x)],
    cells: rows.map((row) => String(x.values[row] ?? '')),
    align: typeof x.values[0] === 'string' ? 'left' : 'right',
  };
}

function axisHead({ name, unit }: ReportAxis): string {
  return unit === undefined ? name : `${name} ${unit}`;
}

/** One value of a limit holds for all points. */
function limitColumn(values: readonly number[], rows: readonly number[]): GridColumn {
  return { head: ['limit'], cells: rows.map((row) => cell(values[row] ?? values[0])), align: 'right' };
}

function cell(value: number | undefined): string {
  return value === undefined ? '' : printNumber(value);
}

function greatestOf(series: FigureBlock['series']): { readonly series: number; readonly point: number } {
  let found = { series: 0, point: 0 };
  let greatest = Number.NEGATIVE_INFINITY;
  series.forEach(({ values }, line) =>
    values.forEach((value, point) => {
      if (value <= greatest) return;
      greatest = value;
      found = { series: line, point };
    }),
  );
  return found;
}

function leftOutLine(rows: number, allRows: number, columns: number, allColumns: number, paint: Paint): string[] {
  const parts = [
    ...(rows < allRows ? [`${rows} of ${allRows} rows`] : []),
    ...(columns < allColumns ? [`${columns} of ${allColumns} columns`] : []),
  ];
  if (parts.length === 0) return [];
  return [paint('dim', `${INDENT}${parts.join(' and ')}, the greatest value among them; \`--format json\` has all`)];
}
