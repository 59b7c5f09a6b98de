import type { Nested } from '../axes/column.ts';
import type { Quantity, ReportAxis } from './model.ts';

/** A point of an axis as reports name it: `C07`, `1130 rpm`, `order 6`. */
export function reportPointText({ name, unit, values }: ReportAxis, index: number): string {
  const point = values[index];
  if (typeof point === 'string') return point;
  if (name === 'harmonic') return `order ${point}`;
  return unit === undefined ? `${name} ${point}` : `${point} ${unit}`;
}

/** A point by axis name and place along it. */
export type ReportPoint = ReadonlyMap<string, number>;

/** Reads a point that a report names, as `at` of a step or check does: axis after axis. */
export function readPoint(at: string, axes: readonly ReportAxis[]): ReportPoint | undefined {
  const point = new Map<string, number>();
  let rest = at;
  for (const axis of axes) {
    const index = axis.values.findIndex((_, i) => startsWithPoint(rest, reportPointText(axis, i)));
    if (index < 0) return undefined;
    point.set(axis.name, index);
    rest = rest.slice(reportPointText(axis, index).length + SEPARATOR.length);
  }
  return point;
}

const SEPARATOR = ', ';

function startsWithPoint(text: string, point: string): boolean {
  return text === point || text.startsWith(point + SEPARATOR);
}

/** The SI value of a quantity at a point; undefined where the quantity varies along an axis that the point leaves open. */
export function siAt({ si, axes }: Quantity, point: ReportPoint): number | undefined {
  let values: Nested | undefined = si;
  for (const { name } of axes) {
    const index = point.get(name);
    values = index === undefined || values === undefined || typeof values === 'number' ? undefined : values[index];
  }
  return typeof values === 'number' ? values : undefined;
}

export function rangeOf(values: Nested): { readonly least: number; readonly greatest: number } {
  let [least, greatest] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  const walk = (part: Nested): void => {
    if (typeof part !== 'number') return part.forEach(walk);
    least = Math.min(least, part);
    greatest = Math.max(greatest, part);
  };
  walk(values);
  return { least, greatest };
}
