import { error, hasErrors, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import type { Argument, LibraryFunction, Parameter } from '../library/function.ts';
import { fromSi } from '../units/convert.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { NO_SITE } from '../units/site.ts';
import { printNumber } from '../units/print.ts';
import { noticeDiagnostics, notFinite } from './notices.ts';
import type { LibraryInstruction } from './program.ts';
import type { Cell } from './run-cell.ts';

/** Whether all numbers among the arguments lie in the ranges that their parameters declare. */
export function inRange({ function: { parameters } }: LibraryInstruction, args: readonly Argument[]): boolean {
  for (let i = 0; i < args.length; i += 1) {
    const [value, parameter] = [args[i], parameters[i]];
    if (parameter === undefined || typeof value !== 'number') continue;
    if (parameter.kind.takes === 'number' && parameter.kind.integer === true && !Number.isInteger(value)) return false;
    const { above, from, below, to } = parameter.range ?? {};
    const fits =
      !(above !== undefined && value <= above) &&
      !(from !== undefined && value < from) &&
      !(below !== undefined && value >= below) &&
      !(to !== undefined && value > to);
    if (!fits) return false;
  }
  return true;
}

/** Calls a function of the library, once its arguments lie in the ranges that it declares. */
export function callLibrary(instruction: LibraryInstruction, { registers, gasOf, diagnostics }: Cell): number {
  const args: Argument[] = instruction.arguments.map((argument) => {
    if ('register' in argument) return registers[argument.register] ?? Number.NaN;
    return 'fixed' in argument ? argument.fixed : gasOf(argument);
  });
  if (args.some(Number.isNaN)) return Number.NaN;
  const outside = rangeFaults(instruction, args);
  diagnostics.push(...outside);
  if (outside.length > 0) return Number.NaN;
  const { value, notices } = instruction.function.evaluate(args);
  const found = noticeDiagnostics(notices, instruction);
  diagnostics.push(...found);
  if (hasErrors(found)) return Number.NaN;
  if (Number.isFinite(value)) return value;
  diagnostics.push(notFinite(instruction.span));
  return Number.NaN;
}

function rangeFaults(
  { function: fn, argumentSpans, span }: LibraryInstruction,
  args: readonly Argument[],
): Diagnostic[] {
  return args.flatMap((argument, i) => {
    const parameter = fn.parameters[i];
    if (parameter === undefined || typeof argument !== 'number') return [];
    return rangeFault(argument, parameter, fn, argumentSpans[i] ?? span);
  });
}

function rangeFault(value: number, parameter: Parameter, fn: LibraryFunction, span: Span): Diagnostic[] {
  const subject = `\`${parameter.name}\` of \`${fn.name}\``;
  const shown = (si: number): string => inUnit(si, parameter);
  const fault = (wanted: string): Diagnostic[] => [
    error('DOMAIN', span, `${subject} must be ${wanted}, and is ${shown(value)}`),
  ];
  if (parameter.kind.takes === 'number' && parameter.kind.integer === true && !Number.isInteger(value))
    return fault('a whole number');
  const { above, from, below, to } = parameter.range ?? {};
  if (above !== undefined && value <= above) return fault(`above ${shown(above)}`);
  if (from !== undefined && value < from) return fault(`at least ${shown(from)}`);
  if (below !== undefined && value >= below) return fault(`below ${shown(below)}`);
  if (to !== undefined && value > to) return fault(`at most ${shown(to)}`);
  return [];
}

/** A SI value in the parameter's own unit; a unit that is a gauge reading would need the atmosphere, so none is. */
function inUnit(si: number, { kind }: Parameter): string {
  const unit = kind.takes === 'quantity' ? parseUnit(kind.unit) : null;
  if (unit === null) return printNumber(si);
  const number = printNumber(fromSi(si, unit, NO_SITE));
  return unit.text === '1' ? number : `${number} ${unit.text}`;
}
