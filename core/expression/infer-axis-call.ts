import {
  AXIS_NAMES,
  axisLength,
  axisPoints,
  isAxisName,
  sameAxis,
  sameCoordinate,
  type Axis,
  type AxisName,
} from '../axes/axis.ts';
import { unionShapes, withoutAxes } from '../axes/shape.ts';
import { nearest } from '../diagnostics/nearest.ts';
import { toSi } from '../units/convert.ts';
import { article, sameDimension, describeType } from '../units/dimensions.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { typeOfUnit } from '../units/unit.ts';
import { addTypes, compareTypes } from '../units/type-algebra.ts';
import { acceptType } from '../units/type-conversion.ts';
import type { AxisFunction, Reduction } from './axis-functions.ts';
import { constantValue } from './constant-value.ts';
import type { Inference, Inferred } from './infer-type.ts';
import type { Call, Expression } from './tree.ts';
import { checkCount, type TypedCall } from './typed-call.ts';
import { unknownTable } from './unknown-name.ts';

/** Type and axes of a call of a function that works along axes; undefined where a fault has been reported. */
export function inferAxisCall(call: Call, fn: AxisFunction, inference: Inference): TypedCall | undefined {
  const names = fn.parameters.map(({ name }) => name).join(', ');
  if (!checkCount(call, fn.parameters.length, fn.parameters.length, names, inference)) return undefined;
  switch (fn.role.does) {
    case 'reduce':
      return fn.role.how === 'envelope' ? envelope(call, inference) : reduce(call, fn.role.how, inference);
    case 'pick':
      return pick(call, inference);
    case 'choose':
      return choose(call, inference);
    case 'interpolate':
      return interpolate(call, inference);
    case 'count':
      return count(call, fn.role.axis, inference);
  }
}

function reduce(call: Call, how: Reduction, inference: Inference): TypedCall | undefined {
  const [x, axisArgument] = call.arguments;
  const operand = x && inference.infer(x);
  const axis = axisArgument && axisOf(axisArgument, call, inference);
  if (operand === undefined || axis === undefined || !varies(call, operand, axis, inference)) return undefined;
  const sum = how === 'sum' ? addTypes(operand, operand) : { type: operand.type };
  if ('fault' in sum) {
    inference.reportFault(sum.fault, call.span);
    return undefined;
  }
  inference.calls.set(call, { call: 'reduce', how, over: [axis] });
  return { type: sum.type, axes: withoutAxes(operand.axes, [axis]) };
}

const ENVELOPED: readonly AxisName[] = ['condition', 'speed'];

function envelope(call: Call, inference: Inference): TypedCall | undefined {
  const operand = call.arguments[0] && inference.infer(call.arguments[0]);
  if (operand === undefined) return undefined;
  const over = ENVELOPED.filter((axis) => operand.axes.includes(axis));
  if (over.length === 0) {
    inference.report('AXIS_MISSING', call.span, 'the argument varies neither along `condition` nor along `speed`', [
      'leave `envelope` out; `max_over(x, axis)` works along any axis',
    ]);
    return undefined;
  }
  inference.calls.set(call, { call: 'reduce', how: 'envelope', over });
  return { type: operand.type, axes: withoutAxes(operand.axes, over) };
}

function pick(call: Call, inference: Inference): TypedCall | undefined {
  const [x, axisArgument, point] = call.arguments;
  const operand = x && inference.infer(x);
  const name = axisArgument && axisOf(axisArgument, call, inference);
  if (operand === undefined || name === undefined || !varies(call, operand, name, inference)) return undefined;
  const axis = inference.scope.axes.get(name);
  const index = axis && point && pointIndex(point, axis, inference);
  if (index === undefined) return undefined;
  inference.calls.set(call, { call: 'pick', axis: name, index });
  return { type: operand.type, axes: withoutAxes(operand.axes, [name]) };
}

/** `where`: its comparison is typed like a check, its values like the arguments of `max`. */
function choose(call: Call, inference: Inference): TypedCall | undefined {
  const [condition, a, b] = call.arguments;
  if (condition === undefined || a === undefined || b === undefined) return undefined;
  const compared = comparison(condition, inference);
  const [first, second] = [inference.infer(a), inference.infer(b)];
  if (!compared || first === undefined || second === undefined) return undefined;
  const common = compareTypes(first, second);
  if ('fault' in common) {
    inference.reportFault(common.fault, b.span);
    return undefined;
  }
  const axes = unionShapes([inference.shapes.get(condition) ?? [], first.axes, second.axes]);
  return { type: common.type, axes };
}

function comparison(condition: Expression, inference: Inference): boolean {
  if (condition.node !== 'comparison') {
    inference.report('FUNCTION_ARGUMENTS', condition.span, '`where` wants a comparison first', [
      'write `where(a <= b, value if so, value if not)`',
    ]);
    return false;
  }
  const [left, right] = [inference.infer(condition.left), inference.infer(condition.right)];
  if (left === undefined || right === undefined) return false;
  const common = compareTypes(left, right);
  if ('fault' in common) {
    inference.reportFault(common.fault, condition.span);
    return false;
  }
  const axes = unionShapes([left.axes, right.axes]);
  if (axes.length > 0) inference.shapes.set(condition, axes);
  return true;
}

function interpolate(call: Call, inference: Inference): TypedCall | undefined {
  const [named, x] = call.arguments;
  const operand = x && inference.infer(x);
  if (named === undefined || x === undefined) return undefined;
  const table = named.node === 'name' ? inference.scope.tables.get(named.name) : undefined;
  if (table === undefined) {
    // What is wrong with a table is said where it stands.
    if (named.node === 'name' && inference.scope.faulty?.has(named.name) === true) return undefined;
    if (named.node === 'name') inference.diagnostics.push(unknownTable(named.name, named.span, inference.scope));
    else
      inference.report('FUNCTION_ARGUMENTS', named.span, '`interpolate` wants the name of a table first', [
        'tables are defined under `tables`, and named without quotation marks',
      ]);
    return undefined;
  }
  if (operand === undefined) return undefined;
  const accepted = acceptType(operand.type, table.x.type);
  if ('fault' in accepted) {
    inference.reportFault(accepted.fault, x.span);
    return undefined;
  }
  if (accepted.factor !== 1) inference.factors.set(x, accepted.factor);
  inference.calls.set(call, { call: 'interpolate', table });
  return { type: table.y.type, axes: operand.axes };
}

/** What may be counted: how many at least and at most, and the axis that many make. */
const COUNTED = {
  harmonic: { least: 1, most: 500, words: 'orders', unit: '1', at: (i: number) => i + 1 },
  angle: { least: 4, most: 3600, words: 'angles', unit: 'deg', at: (i: number, n: number) => (2 * Math.PI * i) / n },
} as const;

function count(call: Call, name: keyof typeof COUNTED, inference: Inference): TypedCall | undefined {
  const { least, most, words, unit: unitText, at } = COUNTED[name];
  const [argument] = call.arguments;
  const n = argument && constantValue(argument);
  if (argument === undefined || n === undefined || !Number.isInteger(n) || n < least || n > most) {
    inference.report(
      'FUNCTION_ARGUMENTS',
      argument?.span ?? call.span,
      `\`${call.function}\` wants a whole number from ${least} to ${most}, written out`,
      [`its length must be known before anything is computed: \`${call.function}(40)\``],
    );
    return undefined;
  }
  const unit = parseUnit(unitText);
  if (unit === null) throw new Error(`the unit table lacks ${unitText}`);
  const type = typeOfUnit(unit);
  const axis: Axis = { name, coordinates: Float64Array.from({ length: n }, (_, i) => at(i, n)), type, unit };
  const known = inference.scope.axes.get(name);
  if (known !== undefined && !sameAxis(known, axis)) {
    inference.report(
      'AXIS_CONFLICT',
      call.span,
      `the axis \`${name}\` has other points already: ${axisLength(known)}`,
      [`all ${words} of one sheet are the same: use one range, or one \`${call.function}(n)\`, and name it`],
    );
    return undefined;
  }
  inference.scope.axes.set(name, axis);
  inference.calls.set(call, { call: 'count', axis: name });
  return { type, axes: [name] };
}

/** The axis that an argument names; undefined where it names none. */
function axisOf(argument: Expression, call: Call, inference: Inference): AxisName | undefined {
  if (argument.node === 'text' && isAxisName(argument.value)) return argument.value;
  const given = argument.node === 'text' ? argument.value : argument.node === 'name' ? argument.name : '';
  const near = isAxisName(given) ? [given] : nearest(given, AXIS_NAMES, 1);
  const wanted =
    near.length > 0 ? `write it between quotation marks: '${near[0]}'` : `axes are '${AXIS_NAMES.join("', '")}'`;
  inference.report('AXIS_UNKNOWN', argument.span, `\`${call.function}\` wants the name of an axis here`, [wanted]);
  return undefined;
}

function varies(call: Call, { axes }: Inferred, axis: AxisName, inference: Inference): boolean {
  if (axes.includes(axis)) return true;
  const has =
    axes.length === 0 ? 'it is a single value' : `it varies along ${axes.map((name) => `\`${name}\``).join(', ')}`;
  inference.report('AXIS_MISSING', call.arguments[0]?.span ?? call.span, `this does not vary along \`${axis}\``, [has]);
  return false;
}

/** Index of a named point: an id between quotation marks, or a value written out. */
function pointIndex(point: Expression, axis: Axis, inference: Inference): number | undefined {
  if ('ids' in axis) {
    const given = point.node === 'text' ? point.value : undefined;
    const index = given === undefined ? -1 : axis.ids.indexOf(given);
    if (index !== -1) return index;
    const near = nearest(given ?? '', axis.ids, 3);
    const hint =
      near.length > 0 ? `did you mean '${near.join("', '")}'?` : `points are '${axis.ids.slice(0, 5).join("', '")}'`;
    inference.report('AXIS_POINT', point.span, `the axis \`${axis.name}\` has no such point`, [hint]);
    return undefined;
  }
  const type = inference.infer(point)?.type;
  if (type === undefined) return undefined;
  const accepted = acceptType(type, axis.type);
  const value = literalSi(point, inference);
  if ('fault' in accepted || value === undefined) {
    const wanted = describeType(axis.type);
    const given = sameDimension(type.dimension, axis.type.dimension)
      ? 'a value that is computed'
      : article(describeType(type));
    inference.report('AXIS_POINT', point.span, `${article(wanted)} written out is wanted, and ${given} is given`, [
      `such as \`${axisPoints(axis)[0] ?? ''}${axis.unit.text === '1' ? '' : ` ${axis.unit.text}`}\``,
    ]);
    return undefined;
  }
  const index = axis.coordinates.findIndex((coordinate) => sameCoordinate(coordinate, value * accepted.factor));
  if (index !== -1) return index;
  const points = axisPoints(axis);
  inference.report('AXIS_POINT', point.span, `the axis \`${axis.name}\` has no such point`, [
    `it runs from ${points[0] ?? ''} to ${points.at(-1) ?? ''}${axis.unit.text === '1' ? '' : ` ${axis.unit.text}`}, in ${points.length} points`,
  ]);
  return undefined;
}

function literalSi(point: Expression, inference: Inference): number | undefined {
  return point.node === 'quantity' ? toSi(point.number, point.unit, inference.scope.site) : constantValue(point);
}
