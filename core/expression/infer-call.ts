import { unionShapes } from '../axes/shape.ts';
import type { LibraryFunction, Parameter } from '../library/function.ts';
import type { QuantityType } from '../units/dimension.ts';
import { NUMBER } from '../units/dimensions.ts';
import { acceptType } from '../units/type-conversion.ts';
import type { TypeFault } from '../units/type-faults.ts';
import { AXIS_FUNCTIONS } from './axis-functions.ts';
import { inferAxisCall } from './infer-axis-call.ts';
import { checkCount, type TypedCall } from './typed-call.ts';
import type { Inference, Inferred } from './infer-type.ts';
import { MATHEMATICS, type MathFunction } from './mathematics.ts';
import type { Call, Expression } from './tree.ts';
import { unknownFunction, unknownGas } from './unknown-name.ts';

/** Type of a call; undefined where a fault has been reported. Arguments are checked even where the function is unknown. */
export function inferCall(call: Call, inference: Inference): TypedCall | undefined {
  const axisFunction = AXIS_FUNCTIONS.get(call.function);
  if (axisFunction !== undefined) return inferAxisCall(call, axisFunction, inference);
  const type = inferSingleCall(call, inference);
  return type && { type, axes: unionShapes(call.arguments.map((argument) => inference.shapes.get(argument) ?? [])) };
}

/** A function that takes single values; over axes it is called for each. */
function inferSingleCall(call: Call, inference: Inference): QuantityType | undefined {
  const mathFunction = MATHEMATICS.get(call.function);
  if (mathFunction !== undefined) return inferMath(call, mathFunction, inference);
  const libraryFunction = inference.scope.functions.get(call.function);
  if (libraryFunction !== undefined) return inferLibrary(call, libraryFunction, inference);
  inference.diagnostics.push(unknownFunction(call.function, call.nameSpan, inference.scope));
  for (const argument of call.arguments) if (!mayNameSomethingElse(argument, inference)) inference.infer(argument);
  return undefined;
}

/** Of an unknown function's arguments, those that some function could take as they are. */
function mayNameSomethingElse(argument: Expression, { scope }: Inference): boolean {
  return argument.node === 'text' || (argument.node === 'name' && scope.gases.has(argument.name));
}

function inferMath(call: Call, fn: MathFunction, inference: Inference): QuantityType | undefined {
  const inferred = call.arguments.map((argument) => inference.infer(argument));
  const most = fn.repeats ? Number.POSITIVE_INFINITY : fn.parameters.length;
  if (!checkCount(call, fn.parameters.length, most, parameterNames(fn), inference)) return undefined;
  const operands = inferred.filter((operand) => operand !== undefined);
  if (operands.length < inferred.length) return undefined;
  const typing = fn.typeOf(operands);
  if ('type' in typing) {
    const [first] = call.arguments;
    if (typing.factor !== undefined && first !== undefined) inference.factors.set(first, typing.factor);
    return typing.type;
  }
  const at = typing.argument === undefined ? undefined : call.arguments[typing.argument];
  inference.reportFault(typing.fault, at?.span ?? call.span);
  return undefined;
}

function parameterNames({ parameters, repeats }: MathFunction): string {
  const names = parameters.map(({ name }) => name).join(', ');
  return repeats ? `${names}, …` : names;
}

function inferLibrary(call: Call, fn: LibraryFunction, inference: Inference): QuantityType | undefined {
  const least = fn.parameters.filter(({ optional }) => optional !== true).length;
  const names = fn.parameters.map(({ name, optional }) => (optional === true ? `${name}?` : name)).join(', ');
  const countFits = checkCount(call, least, fn.parameters.length, names, inference);
  const argumentsFit = call.arguments.map((argument, i) => {
    const parameter = fn.parameters[i];
    return parameter === undefined || inferArgument(argument, parameter, fn, inference);
  });
  if (!countFits || argumentsFit.includes(false)) return undefined;
  const { dimension, kind } = fn.returns;
  return { dimension, kind };
}

function inferArgument(argument: Expression, parameter: Parameter, fn: LibraryFunction, inference: Inference): boolean {
  switch (parameter.kind.takes) {
    case 'gas':
      return gasArgument(argument, parameter, fn, inference);
    case 'text':
      return textArgument(argument, parameter, fn, parameter.kind.examples, inference);
    case 'size':
      return argument.node === 'text' || numberArgument(argument, parameter, fn, inference);
    case 'number':
      return numberArgument(argument, parameter, fn, inference);
    case 'quantity': {
      const { dimension, kind } = parameter.kind;
      return valueArgument(argument, parameter, fn, { dimension, kind }, inference);
    }
  }
}

function gasArgument(argument: Expression, parameter: Parameter, fn: LibraryFunction, inference: Inference): boolean {
  if (argument.node === 'name' && inference.scope.gases.has(argument.name)) {
    const axes = inference.scope.shapes.get(argument.name);
    if (axes !== undefined) inference.shapes.set(argument, axes);
    return true;
  }
  if (argument.node === 'name' && !inference.scope.types.has(argument.name)) {
    inference.diagnostics.push(unknownGas(argument.name, argument.span, inference.scope));
    return false;
  }
  const quoted = argument.node === 'text' && inference.scope.gases.has(argument.value);
  inference.report('FUNCTION_ARGUMENTS', argument.span, `${subject(parameter, fn)} wants the name of a gas`, [
    quoted
      ? `write \`${argument.value}\` without quotation marks`
      : 'gases are defined under `gases`, and named without quotation marks',
  ]);
  return false;
}

function textArgument(
  argument: Expression,
  parameter: Parameter,
  fn: LibraryFunction,
  examples: readonly string[],
  inference: Inference,
): boolean {
  if (argument.node === 'text') return true;
  const example = argument.node === 'name' ? argument.name : (examples[0] ?? '');
  inference.report('FUNCTION_ARGUMENTS', argument.span, `${subject(parameter, fn)} wants a quoted text`, [
    argument.node === 'name' && examples.length > 0
      ? `write it between quotation marks, such as '${examples.join("', '")}'`
      : `write it between quotation marks: '${example}'`,
  ]);
  return false;
}

function numberArgument(
  argument: Expression,
  parameter: Parameter,
  fn: LibraryFunction,
  inference: Inference,
): boolean {
  return valueArgument(argument, parameter, fn, { dimension: NUMBER, kind: 'plain' }, inference);
}

function valueArgument(
  argument: Expression,
  parameter: Parameter,
  fn: LibraryFunction,
  wanted: QuantityType,
  inference: Inference,
): boolean {
  if (argument.node === 'text') {
    inference.report(
      'FUNCTION_ARGUMENTS',
      argument.span,
      `${subject(parameter, fn)} wants a value, and a text is given`,
    );
    return false;
  }
  const given: Inferred | undefined = inference.infer(argument);
  if (given === undefined) return false;
  const accepted = acceptType(given.type, wanted);
  if ('fault' in accepted) {
    inference.reportFault(withSubject(accepted.fault, parameter, fn), argument.span);
    return false;
  }
  if (accepted.factor !== 1) inference.factors.set(argument, accepted.factor);
  return true;
}

function withSubject(fault: TypeFault, parameter: Parameter, fn: LibraryFunction): TypeFault {
  return { ...fault, message: `${subject(parameter, fn)}: ${fault.message}` };
}

function subject(parameter: Parameter, fn: LibraryFunction): string {
  return `\`${parameter.name}\` of \`${fn.name}\``;
}
