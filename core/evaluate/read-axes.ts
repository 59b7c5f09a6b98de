import { sameAxis, type Axis, type AxisName } from '../axes/axis.ts';
import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { InputNode, SheetDocument, Text } from '../sheet/document.ts';
import { LIMITS } from '../sheet/limits.ts';
import type { Overrides } from './overrides.ts';
import { toSi } from '../units/convert.ts';
import type { QuantityType } from '../units/dimension.ts';
import { describeType, FREQUENCY, isNumber, LENGTH, sameDimension } from '../units/dimensions.ts';
import { parseQuantity } from '../units/parse-quantity.ts';
import { isRange, parseRange, rangePoints } from '../units/parse-range.ts';
import { NO_SITE } from '../units/site.ts';
import { typeOfUnit } from '../units/unit.ts';

export interface Axes {
  readonly axes: Map<AxisName, Axis>;
  /** The axis that each input with a range of values runs along; its values are the axis's own. */
  readonly ranges: ReadonlyMap<InputNode, AxisName>;
  readonly diagnostics: readonly Diagnostic[];
}

/**
 * The axes that a sheet lays down itself: its operating conditions, and the ranges among its inputs. What a range runs
 * along follows from what it is: a rate is a speed, whole numbers are orders, an angle is a crank angle, a length a place.
 *
 * @param overrides a single value in the place of a range makes an axis of one point
 * @param condition restricts the operating conditions to this one
 */
export function readAxes(document: SheetDocument, overrides: Overrides, condition: string | undefined): Axes {
  const axes = new Map<AxisName, Axis>();
  const ranges = new Map<InputNode, AxisName>();
  const diagnostics: Diagnostic[] = [];
  const { conditions } = document;
  if (conditions !== undefined) {
    const ids = conditions.ids.map(({ text }) => text);
    axes.set('condition', {
      name: 'condition',
      ids: condition === undefined ? ids : ids.filter((id) => id === condition),
    });
  }
  for (const node of document.inputs) {
    if (!isRange(node.value.text)) continue;
    const { text } = overrides.of(node);
    const { value: axis, diagnostics: found } = isRange(text.text) ? rangeAxis(text) : pointAxis(text);
    diagnostics.push(...found);
    if (axis === undefined) continue;
    const known = axes.get(axis.name);
    if (known !== undefined && !sameAxis(known, axis)) diagnostics.push(conflict(node, axis.name, ranges));
    else axes.set(axis.name, axis);
    ranges.set(node, axis.name);
  }
  return { axes, ranges, diagnostics };
}

function rangeAxis({ text, span }: Text): Diagnosed<Axis> {
  const { value: range, diagnostics } = parseRange(text, span);
  if (range === undefined) return { diagnostics };
  const { unit } = range;
  const type = typeOfUnit(unit);
  const name = axisFor(type);
  if (name === null) {
    return fail(span, `a range of ${describeType(type)} runs along no axis`, [
      'ranges are of speeds (rpm, Hz), orders (whole numbers), angles or lengths; other values vary by `conditions`',
    ]);
  }
  const isOrders = name === 'harmonic';
  if (isOrders && ![range.from, range.to, range.step ?? 1].every(Number.isInteger))
    return fail(span, 'orders are whole numbers', ['write `6..12`, or give the values their unit']);
  const step = range.step ?? (isOrders ? 1 : undefined);
  if (step === undefined) {
    return fail(span, `the range has no step`, [`write \`${text.trim()} step … ${unit.text}\``]);
  }
  const points = rangePoints({ ...range, step }, LIMITS.points);
  if (points === null)
    return fail(span, `the range has more than ${LIMITS.points} points`, ['make the step larger'], 'LIMIT_EXCEEDED');
  const coordinates = Float64Array.from(points, (point) => toSi(point, unit, NO_SITE));
  return { value: { name, coordinates, type, unit }, diagnostics };
}

/** The axis of one point, in the place of a range. */
function pointAxis({ text, span }: Text): Diagnosed<Axis> {
  const { value, diagnostics } = parseQuantity(text, span);
  if (value === undefined) return { diagnostics };
  const { unit, number } = value;
  const type = typeOfUnit(unit);
  const name = axisFor(type);
  if (name === null)
    return fail(span, `${describeType(type)} runs along no axis`, ['set a value like those of the range'], 'OVERRIDE');
  return { value: { name, coordinates: Float64Array.of(toSi(number, unit, NO_SITE)), type, unit }, diagnostics };
}

function axisFor({ dimension, kind }: QuantityType): AxisName | null {
  if (sameDimension(dimension, FREQUENCY)) return 'speed';
  if (sameDimension(dimension, LENGTH)) return 'place';
  if (!isNumber(dimension)) return null;
  if (kind === 'radians' || kind === 'cycles') return 'angle';
  return kind === 'plain' ? 'harmonic' : null;
}

function conflict(node: InputNode, axis: AxisName, ranges: ReadonlyMap<InputNode, AxisName>): Diagnostic {
  const first = [...ranges].find(([, name]) => name === axis)?.[0];
  const message = `\`${node.name.text}\` gives the axis \`${axis}\` other points than it has`;
  return error('AXIS_CONFLICT', node.value.span, message, {
    labels: first === undefined ? [] : [{ span: first.value.span, text: 'the axis has these points' }],
    hints: ['a sheet has one axis of each name: use the same range, or compute one from the other'],
  });
}

function fail(
  span: Text['span'],
  message: string,
  hints: readonly string[],
  code: Diagnostic['code'] = 'QUANTITY_SYNTAX',
): Diagnosed<Axis> {
  return { diagnostics: [error(code, span, message, { hints })] };
}
