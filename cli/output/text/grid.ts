import { INDENT, padEnd, padStart, spaced, WIDTH, widest } from './layout.ts';
import type { Paint } from '../../terminal.ts';

export interface GridColumn {
  /** Lines above the cells; all columns of a grid have equally many. */
  readonly head: readonly string[];
  readonly cells: readonly string[];
  readonly align: 'left' | 'right';
}

const GAP = '  ';

/**
 * Columns side by side, each row led by its cell of `lead`. Where they are wider than a page, they go on below, with the
 * leading column again.
 */
export function gridLines(lead: GridColumn, columns: readonly GridColumn[], paint: Paint): string[] {
  return spaced(panels(lead, columns).map((panel) => panelLines([lead, ...panel], paint)));
}

function panels(lead: GridColumn, columns: readonly GridColumn[]): GridColumn[][] {
  const leadWidth = INDENT.length + columnWidth(lead);
  const found: GridColumn[][] = [[]];
  let width = leadWidth;
  for (const column of columns) {
    const wanted = GAP.length + columnWidth(column);
    if (width + wanted > WIDTH && found.at(-1)?.length !== 0) {
      found.push([]);
      width = leadWidth;
    }
    found.at(-1)?.push(column);
    width += wanted;
  }
  return found;
}

function panelLines(columns: readonly GridColumn[], paint: Paint): string[] {
  const widths = columns.map(columnWidth);
  const row = (cellOf: (column: GridColumn) => string): string => {
    const cells = columns.map((column, i) =>
      (column.align === 'right' ? padStart : padEnd)(cellOf(column), widths[i] ?? 0),
    );
    return `${INDENT}${cells.join(GAP)}`.trimEnd();
  };
  const head = columns[0]?.head.map((_, line) => row(({ head: lines }) => lines[line] ?? '')) ?? [];
  const body = columns[0]?.cells.map((_, line) => row(({ cells }) => cells[line] ?? '')) ?? [];
  return [...head.filter((line) => line !== '').map((line) => paint('dim', line)), ...body];
}

function columnWidth({ head, cells }: GridColumn): number {
  return widest([...head, ...cells]);
}
