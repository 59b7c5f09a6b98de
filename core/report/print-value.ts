import { extremes } from '../axes/column.ts';
import { cellText } from '../axes/points.ts';
import { absoluteUnit } from '../units/display.ts';
import { printQuantity, printSpread, printTyped, type PrintOptions } from '../units/print.ts';
import type { Printed } from '../units/printed.ts';
import type { DraftContext } from './draft.ts';
import type { TypedNumber, Value } from './evaluated-sheet.ts';
import type { Extreme } from './model.ts';

/** A single value; of values over axes, the least and the greatest: `95.0 … 160.0 psig`. */
export function printValue(value: Value, digits: number | undefined, context: DraftContext): Printed {
  const { least, greatest } = extremes(value.column);
  const [from, to] = [value.column.data[least] ?? Number.NaN, value.column.data[greatest] ?? Number.NaN];
  return printSpread(from, to, value.unit, printOptions(digitsOf(value, digits), context));
}

export function printCell(value: Value, cell: number, digits: number | undefined, context: DraftContext): Printed {
  return printQuantity(
    value.column.data[cell] ?? Number.NaN,
    value.unit,
    printOptions(digitsOf(value, digits), context),
  );
}

/** Orders and other whole numbers over an axis need no decimals. */
function digitsOf({ column, unit }: Value, digits: number | undefined): number | undefined {
  const isCount = unit.text === '1' && column.axes.length > 0 && column.data.every(Number.isInteger);
  return digits ?? (isCount ? 1 : undefined);
}

/** An input keeps the digits it was typed with, as long as it is shown in the unit it was typed in. */
export function printInput(
  value: Value,
  typed: TypedNumber | null,
  digits: number | undefined,
  context: DraftContext,
): Printed {
  if (typed !== null && digits === undefined) return printTyped(typed.text, value.unit);
  return printValue(value, digits, context);
}

/** In a product a gauge reading would mislead: there, its absolute pressure stands. */
export function inAbsolute(value: Value): Value {
  return { ...value, unit: absoluteUnit(value.unit) };
}

export function printOptions(digits: number | undefined, context: DraftContext): PrintOptions {
  return { ...(digits === undefined ? {} : { digits }), site: context.sheet.site };
}

/** What a block over axes says of all its values; nothing for a single value. */
export function spreadOf(
  value: Value,
  digits: number | undefined,
  context: DraftContext,
): { readonly axes?: readonly string[]; readonly extent?: { readonly least: Extreme; readonly greatest: Extreme } } {
  const { axes } = value.column;
  if (axes.length === 0) return {};
  const { least, greatest } = extremes(value.column);
  const extreme = (cell: number): Extreme => ({
    printed: printCell(value, cell, digits, context),
    at: cellText(cell, axes, context.sheet.axes),
  });
  return { axes, extent: { least: extreme(least), greatest: extreme(greatest) } };
}
