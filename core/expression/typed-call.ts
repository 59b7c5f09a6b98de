import type { Shape } from '../axes/shape.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { Inference } from './infer-type.ts';
import type { Call } from './tree.ts';

/** What a call gives, and along which axes it varies. */
export interface TypedCall {
  readonly type: QuantityType;
  readonly axes: Shape;
}

/** Whether a call has as many arguments as its function takes; a fault is reported where it has not. */
export function checkCount(call: Call, least: number, most: number, names: string, inference: Inference): boolean {
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
