import type { DiagnosticCode } from '../diagnostics/codes.ts';
import type { QuantityType } from './dimension.ts';
import { article, describeType, isNumber, PRESSURE, sameDimension } from './dimensions.ts';

/** Why two types do not go together, and what the engineer probably meant. */
export interface TypeFault {
  readonly code: DiagnosticCode;
  readonly message: string;
  readonly hints: readonly string[];
}

export type TypeResult = { readonly type: QuantityType } | { readonly fault: TypeFault };

export function levelMeetsDifference({ dimension }: QuantityType): TypeFault {
  const pressure = sameDimension(dimension, PRESSURE);
  return {
    code: 'UNIT_MISMATCH',
    message: `a ${pressure ? 'pressure' : 'temperature'} level is compared with a ${pressure ? 'pressure' : 'temperature'} difference`,
    hints: [
      pressure
        ? 'write psia or psig (bara, barg) for a pressure level, psi (bar) for a difference'
        : 'write degF or degC for a temperature level, delta_degF or delta_degC for a difference',
    ],
  };
}

export function levelSum({ dimension }: QuantityType): TypeFault {
  const pressure = sameDimension(dimension, PRESSURE);
  return {
    code: 'LEVEL_SUM',
    message: `two ${pressure ? 'pressure' : 'temperature'} levels are added`,
    hints: [
      pressure
        ? 'add a difference: `psi`, `bar` or `kPa` without g or a; for their mean write mean(p_1, p_2)'
        : 'add a difference: `delta_degC` or `delta_degF`; for their mean write mean(T_1, T_2)',
    ],
  };
}

export function mismatch(verb: string, left: QuantityType, right: QuantityType): TypeResult {
  return {
    fault: {
      code: 'UNIT_MISMATCH',
      message: `${article(describeType(left))} and ${article(describeType(right))} are ${verb}`,
      hints:
        isNumber(left.dimension) || isNumber(right.dimension) ? ['give the bare number its unit, if it has one'] : [],
    },
  };
}

export function cyclesMeetRadians(verb: string): TypeFault {
  return {
    code: 'CYCLES_AND_RADIANS',
    message: `a rate in cycles and one in radians are ${verb}`,
    hints: ['bring both to one: 2*pi times cycles are radians, radians over 2*pi are cycles'],
  };
}
