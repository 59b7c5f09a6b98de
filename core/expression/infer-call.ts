import type { LibraryFunction, Parameter } from '../library/function.ts';
import type { QuantityType } from '../units/dimension.ts';
import { NUMBER } from '../units/dimensions.ts';
import { acceptType } from '../units/type-conversion.ts';
import type { TypeFault } from '../units/type-algebra.ts';
import type { Inference, Inferred } from './infer-type.ts';
import { MATHEMATICS, type MathFunction } from './mathematics.ts';
import type { Expression } from './tree.ts';
import { unknownFunction, unknownGas } from './unknown-name.ts';

type Call = Expression & { readonly node: 'call' };

/** Type of a call; undefined where a fault has been reported. Arguments are checked even where the function is unknown. */
export function inferCall(call: Call, inference: Inference): QuantityType | undefined {
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
  if ('type' in typing) return typing.type;
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

function checkCount(call: Call, least: number, most: number, names: string, inference: Inference): boolean {
  const given = call.arguments.length;
  if (given >= least && given <= most) return true;
  const wanted =
    least === most ? String(least) : most === Number.POSITIVE_INFINITY ? `${least} or more` : `${least} to ${most}`;
  const surplus = given > most ? call.arguments[most] : undefined;
  const span = surplus === undefined ? call.span : { ...call.span, start: surplus.span.start, end: call.span.end - 1 };
  const noun = wanted === '1' ? 'argument' : 'arguments';
  inference.report(
    'FUNCTION_ARGUMENTS',
    span,
    `\`${call.function}\` takes ${wanted} ${noun}, and ${given === 0 ? 'none' : given} ${given > 1 ? 'are' : 'is'} given`,
    [`it is written \`${call.function}(${names})\``],
  );
  return false;
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
  if (argument.node === 'name' && inference.scope.gases.has(argument.name)) return true;
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
