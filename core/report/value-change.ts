import { exceeds, type Nested } from '../axes/column.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { DEFAULT_DIGITS, printNumber } from '../units/print.ts';
import type { Unit } from '../units/unit.ts';
import { close } from './compare-reports.ts';
import type { Quantity, ReportAxis } from './model.ts';
import { reportPointText } from './report-points.ts';

/** How a value changed; of values over axes, where it changed most. */
export interface ValueChange {
  /** Printed, with unit. */
  readonly before: string;
  readonly after: string;
  /**
   * Change as a share of the value before; of a level, of the absolute level. Null where the ratio has no sense: from
   * zero, across zero, or between quantities of different dimensions.
   */
  readonly relative: number | null;
  /** Of levels and percentages: `+15 psi`, `+0.6 points`. */
  readonly difference?: string;
  /** Where it changed most: `C07, 1130 rpm`. */
  readonly at?: string;
}

/** Null where the values agree within the rounding of engines. */
export function valueChange(before: Quantity, after: Quantity): ValueChange | null {
  if (before.dimension !== after.dimension || !sameAxes(before, after)) return spreadChange(before, after);
  if (after.axes.length === 0) {
    const [from, to] = [before.si, after.si];
    if (typeof from !== 'number' || typeof to !== 'number')
      throw new Error(`${after.path} has no axes, and no single value`);
    return close(from, to) ? null : { ...plainTexts(before, after), ...measure(from, to, after) };
  }
  const places = after.axes.map((axis, i) => placesIn(before.axes[i], axis));
  if (places.some((found) => found.every((place) => place === undefined))) return spreadChange(before, after);
  const greatest = greatestChange(before, after, places);
  if (greatest === null) return null;
  return {
    before: withUnit(greatest.before.value, before.unit),
    after: withUnit(greatest.after.value, after.unit),
    ...measure(greatest.before.si, greatest.after.si, after),
    at: greatest.at,
  };
}

function sameAxes(a: Quantity, b: Quantity): boolean {
  return a.axes.length === b.axes.length && a.axes.every(({ name }, i) => name === b.axes[i]?.name);
}

/** Values that cannot be held against each other point by point. */
function spreadChange(before: Quantity, after: Quantity): ValueChange {
  return { ...plainTexts(before, after), relative: null };
}

function plainTexts(before: Quantity, after: Quantity): { readonly before: string; readonly after: string } {
  const text = ({ printed: { number, unit } }: Quantity): string => (unit === '' ? number : `${number} ${unit}`);
  return { before: text(before), after: text(after) };
}

function withUnit(value: number, unit: string): string {
  return unit === '1' ? printNumber(value) : `${printNumber(value)} ${unit}`;
}

interface CellValue {
  readonly value: number;
  readonly si: number;
}

interface CellPair {
  readonly before: CellValue;
  readonly after: CellValue;
  readonly at: string;
}

/** For each axis and each of its points, the place of the point among those before. */
type Places = readonly (readonly (number | undefined)[])[];

type Visit = (before: CellValue, after: CellValue, point: readonly number[]) => void;

/** Goes through the cells of points that both have; a point that only one has is a change of the axis. */
function visitCommonCells(before: Quantity, after: Quantity, places: Places, visit: Visit): void {
  const point: number[] = [];
  const walk = (valueA: Nested, siA: Nested, valueB: Nested, siB: Nested): void => {
    if (
      typeof valueA === 'number' &&
      typeof siA === 'number' &&
      typeof valueB === 'number' &&
      typeof siB === 'number'
    ) {
      visit({ value: valueA, si: siA }, { value: valueB, si: siB }, point);
      return;
    }
    places[point.length]?.forEach((from, to) => {
      if (from === undefined) return;
      const parts = [partAt(valueA, from), partAt(siA, from), partAt(valueB, to), partAt(siB, to)] as const;
      point.push(to);
      walk(...parts);
      point.pop();
    });
  };
  walk(before.value, before.si, after.value, after.si);
}

/** For each point of an axis, its place among the points before; undefined where it was not there. */
function placesIn(before: ReportAxis | undefined, after: ReportAxis): (number | undefined)[] {
  const places = new Map((before?.values ?? []).map((point, i) => [pointKey(point), i]));
  const sameUnit = before?.unit === after.unit;
  return after.values.map((point) => (sameUnit ? places.get(pointKey(point)) : undefined));
}

/** Ids as they are; values freed of rounding. */
export function pointKey(point: string | number): string {
  return typeof point === 'string' ? `id ${point}` : point.toPrecision(9);
}

function partAt(part: Nested, index: number): Nested {
  const found = typeof part === 'number' ? undefined : part[index];
  if (found === undefined) throw new Error('an array of the report is shorter than its axis');
  return found;
}

/** The cell with the largest relative change; a change without a ratio (from zero, or across it) comes before all. */
function greatestChange(before: Quantity, after: Quantity, places: Places): CellPair | null {
  let [most, mostApart] = [0, 0];
  let greatest: CellPair | null = null;
  visitCommonCells(before, after, places, (a, b, point) => {
    if (close(a.si, b.si)) return;
    const size = Math.abs(ratioOf(a.si, b.si, after) ?? Number.POSITIVE_INFINITY);
    const apart = Math.abs(b.si - a.si);
    if (!exceeds(size, most) && !(size === most && exceeds(apart, mostApart))) return;
    [most, mostApart] = [size, apart];
    greatest = {
      before: a,
      after: b,
      at: after.axes.map((axis, i) => reportPointText(axis, point[i] ?? 0)).join(', '),
    };
  });
  return greatest;
}

function ratioOf(from: number, to: number, { dimension }: Quantity): number | null {
  const hasRatio = dimension.endsWith(' level') ? from > 0 : from * to > 0;
  return hasRatio ? (to - from) / Math.abs(from) : null;
}

function measure(from: number, to: number, quantity: Quantity): Pick<ValueChange, 'relative' | 'difference'> {
  const relative = ratioOf(from, to, quantity);
  const difference = differenceText(to - from, quantity);
  return { relative, ...(difference === undefined ? {} : { difference }) };
}

/** The distance between two levels in the unit of differences that goes with theirs; between percentages, in points. */
function differenceText(si: number, { dimension, unit }: Quantity): string | undefined {
  if (dimension === 'percentage') return `${signed(si * 100)} points`;
  const level = parseUnit(unit);
  if (!dimension.endsWith(' level') || level === null) return undefined;
  return `${signed(si / level.factor)} ${differenceUnit(level)}`;
}

function differenceUnit({ text, factor }: Unit): string {
  const candidates = [text.slice(0, -1), `delta_${text}`].flatMap((name) => parseUnit(name) ?? []);
  return candidates.find((unit) => unit.kind === 'difference' && unit.factor === factor)?.text ?? text;
}

function signed(number: number): string {
  return `${number > 0 ? '+' : ''}${Number(number.toPrecision(DEFAULT_DIGITS))}`;
}
