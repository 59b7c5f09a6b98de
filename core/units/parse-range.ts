import { error, type Diagnosed, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { parseQuantity, type ParsedQuantity } from './parse-quantity.ts';
import type { Unit } from './unit.ts';

/** A range as typed: both ends, and the step between its points where one is given. All in one unit. */
export interface ParsedRange {
  readonly from: number;
  readonly to: number;
  readonly step?: number;
  readonly unit: Unit;
}

/** Whether a value is written as a range. */
export function isRange(text: string): boolean {
  return text.includes('..');
}

const RANGE = /^(\s*)(.+?)(\s*\.\.\s*)(.+?)(?:(\s+step\s+)(.+?))?\s*$/;

/**
 * Reads a range: `6..12`, `600..1200 rpm step 10 rpm`, `2 ft..9 ft step 6 in`. Where the first end, or the step, is a bare
 * number it has the unit of the second end.
 *
 * @param text exactly what `span` covers
 */
export function parseRange(text: string, span: Span): Diagnosed<ParsedRange> {
  const match = RANGE.exec(text);
  const [, lead = '', first, dots = '', second, word = '', stepText] = match ?? [];
  if (first === undefined || second === undefined) {
    return fail('QUANTITY_SYNTAX', span, 'the range lacks one of its ends', ['write `600..1200 rpm step 10 rpm`']);
  }
  const place = (start: number, length: number): Span =>
    span.end - span.start === text.length
      ? { ...span, start: span.start + start, end: span.start + start + length }
      : span;
  const secondAt = lead.length + first.length + dots.length;
  const from = parseQuantity(first, place(lead.length, first.length));
  const to = parseQuantity(second, place(secondAt, second.length));
  const stepSpan = place(secondAt + second.length + word.length, stepText?.length ?? 0);
  const step = stepText === undefined ? undefined : parseQuantity(stepText, stepSpan);
  const diagnostics = [from, to, step].flatMap((part) => part?.diagnostics ?? []);
  if (from.value === undefined || to.value === undefined || diagnostics.length > 0) return { diagnostics };
  const { unit } = to.value;
  const [start, width] = [inUnit(from.value, unit), step?.value && inUnit(step.value, unit)];
  if (start === null || width === null) {
    const of = start === null ? from.value : step?.value;
    return fail(
      'UNIT_MISMATCH',
      of?.span ?? span,
      `\`${of?.unit.text ?? ''}\` and \`${unit.text}\` stand in one range`,
      ['write both ends and the step in one unit'],
    );
  }
  if (!(to.value.number > start)) {
    return fail('QUANTITY_SYNTAX', span, 'the range does not rise', ['write the smaller end first']);
  }
  if (width !== undefined && !(width > 0)) {
    return fail('QUANTITY_SYNTAX', stepSpan, 'the step is not above zero', ['write `step 10 rpm`']);
  }
  return {
    value: { from: start, to: to.value.number, ...(width === undefined ? {} : { step: width }), unit },
    diagnostics,
  };
}

/** A number of a range in the range's own unit; null where the two units are not the same. Feet and inches count as one. */
function inUnit({ number, unit }: ParsedQuantity, wanted: Unit): number | null {
  if (unit.text === wanted.text || unit.text === '1') return number;
  const isPlain = unit.shift === 0 && wanted.shift === 0 && !unit.gauge && !wanted.gauge;
  const sameDimension = unit.dimension.every((exponent, i) => exponent === wanted.dimension[i]);
  return isPlain && sameDimension && unit.kind === wanted.kind ? (number * unit.factor) / wanted.factor : null;
}

/**
 * Points of a range, both ends among them: where the step does not fit, the last one is shorter.
 *
 * @param most the number of points that a range may have; null beyond it
 */
export function rangePoints(range: ParsedRange & { readonly step: number }, most: number): number[] | null {
  const { from, to, step } = range;
  const whole = Math.floor((to - from) / step + 1e-9);
  if (whole + 1 > most) return null;
  const points = Array.from({ length: whole + 1 }, (_, i) => from + i * step);
  const last = points.at(-1) ?? from;
  if (to - last > 1e-9 * step) points.push(to);
  else points[points.length - 1] = to;
  return points;
}

function fail(code: Diagnostic['code'], span: Span, message: string, hints: readonly string[]): Diagnosed<ParsedRange> {
  return { diagnostics: [error(code, span, message, { hints })] };
}
