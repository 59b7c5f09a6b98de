import { printTyped } from '../units/print.ts';
import {
  annotationContent,
  annotations,
  ATMOSPHERE_PATH,
  place,
  plainText,
  type Draft,
  type DraftContext,
} from './draft.ts';
import type { EvaluatedColumn } from './evaluated-sheet.ts';
import { printCell, printValue, spreadOf } from './print-value.ts';

/** A column of the operating conditions: a block of its own, so that it can be ticked, remarked on and compared. */
export function columnDraft(column: EvaluatedColumn, context: DraftContext): Draft {
  const { node, cells } = column;
  const name = node.name.text;
  const typed = cells.map((cell) => plainText(cell.text));
  const content = {
    block: 'column',
    name,
    unit: node.unit?.text ?? null,
    cells: typed,
    ids: idsOf(context),
    hold: node.hold?.text ?? null,
    annotations: annotationContent(node, context),
  };
  const base = {
    path: `conditions/${name}`,
    name,
    ...annotations(node, name, context),
    ...(node.hold === undefined ? {} : { hold: node.hold.text }),
    place: place(node.name, context),
  };
  if (column.column !== 'quantity') {
    const uses = column.column === 'gas' ? [...new Set(typed.map((gas) => `gases/${gas}`))] : [];
    return { block: { block: 'column', ...base, holds: column.column, cells: typed }, content, uses };
  }
  const { value } = column;
  const printed = cells.map((_, cell) => conditionNumber(column, cell, context));
  return {
    block: {
      block: 'input',
      ...base,
      symbol: context.symbolOf(name),
      typed: typed.join(', '),
      printed: printValue(value, node.digits, context),
      ...spreadOf(value, node.digits, context),
      cells: printed,
    },
    content,
    uses: value.unit.gauge ? [ATMOSPHERE_PATH] : [],
  };
}

/** The value of one condition, with the digits it was typed with. */
export function conditionNumber(
  { node, value, typed }: EvaluatedColumn & { readonly column: 'quantity' },
  cell: number,
  context: DraftContext,
): string {
  const asTyped = typed[cell];
  return asTyped !== null && asTyped !== undefined && node.digits === undefined
    ? printTyped(asTyped.text, value.unit).number
    : printCell(value, cell, node.digits, context).number;
}

function idsOf({ sheet }: DraftContext): readonly string[] {
  const axis = sheet.axes.get('condition');
  return axis !== undefined && 'ids' in axis ? axis.ids : [];
}
