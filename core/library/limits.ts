import {
  API_618_DAMPER_PRESSURE_DROP,
  API_618_FLANGE_PULSATION,
  API_618_LINE_PULSATION,
  api618DamperPressureDropLimit,
  api618FlangePulsationLimit,
  api618LinePulsationLimit,
} from '../limits/api-618.ts';
import type { LimitEntry } from '../limits/limit-entry.ts';
import { numberAt } from './arguments.ts';
import type { Argument, FunctionResult, LibraryFunction } from './function.ts';
import {
  FREQUENCY_OF_SOUND,
  PERCENT,
  PRESSURE_RATIO,
  SOUND_SPEED,
  lengthParameter,
  pressureParameter,
} from './parameters.ts';

/** The words that name a limit's text: every report shows that the figures are to be verified. */
function sourceOf({ standard, edition, clause, status }: LimitEntry<unknown>): string {
  return `${standard}, ${edition}, ${clause}; from memory: ${status}`;
}

export const LIMITS_FUNCTIONS: readonly LibraryFunction[] = [
  {
    name: 'api618_line_pulsation_limit',
    topic: 'limits',
    summary: 'Allowable pulsation of one harmonic in the line, peak to peak, share of the mean absolute line pressure',
    symbol: 'P_1',
    formula:
      'P_1 = \\sqrt{\\frac{c}{350\\,\\mathrm{m/s}}}\\;\\frac{400\\,\\%}{\\sqrt{\\frac{p_\\mathrm{L}}{\\mathrm{bar(a)}}\\,\\frac{D_\\mathrm{i}}{\\mathrm{mm}}\\,\\frac{f}{\\mathrm{Hz}}}}',
    parameters: [
      SOUND_SPEED,
      pressureParameter('p_line', 'p_\\mathrm{L}', 'mean line pressure, absolute'),
      lengthParameter('bore', 'D_\\mathrm{i}', 'inside diameter of the line', 'mm'),
      FREQUENCY_OF_SOUND,
    ],
    returns: { ...PERCENT, summary: API_618_LINE_PULSATION.basis },
    validity:
      'Design approaches 2 and 3, each harmonic by itself, beyond the pulsation suppression device; 3.5 to 350 bar(a). Below 3.5 bar(a) the allowable pressure is that computed for 3.5 bar(a). The formula in US units of the same text is 0.8 % tighter.',
    source: sourceOf(API_618_LINE_PULSATION),
    example: { call: 'api618_line_pulsation_limit(400 m/s, 60 bara, 193.7 mm, 25 Hz)', result: '0.7933 %' },
    evaluate: linePulsationLimit,
  },
  {
    name: 'api618_flange_pulsation_limit',
    topic: 'limits',
    summary:
      'Allowable overall pulsation at the cylinder flange, peak to peak, share of the mean absolute line pressure',
    symbol: 'P_\\mathrm{cf}',
    formula: 'P_\\mathrm{cf} = \\min\\left(7\\,\\%,\\ 3\\,R\\,\\%\\right)',
    parameters: [PRESSURE_RATIO],
    returns: { ...PERCENT, summary: API_618_FLANGE_PULSATION.basis },
    validity: 'Unfiltered pulsation; a higher value may be agreed between purchaser and vendor.',
    source: sourceOf(API_618_FLANGE_PULSATION),
    example: { call: 'api618_flange_pulsation_limit(2)', result: '6.000 %' },
    evaluate: (args) => ({ value: api618FlangePulsationLimit(numberAt(args, 0)), notices: [] }),
  },
  {
    name: 'api618_damper_pressure_drop_limit',
    topic: 'limits',
    summary: 'Allowable pressure drop of a pulsation suppression device without separator',
    symbol: '\\Delta P_\\mathrm{max}',
    formula: '\\Delta P_\\mathrm{max} = \\max\\left(0.25\\,\\%,\\ 1.67\\,\\frac{R-1}{R}\\,\\%\\right)',
    parameters: [PRESSURE_RATIO],
    returns: { ...PERCENT, summary: API_618_DAMPER_PRESSURE_DROP.basis },
    validity: 'Devices without an integral separator; choke tubes and nozzle orifices count as part of the device.',
    source: sourceOf(API_618_DAMPER_PRESSURE_DROP),
    example: { call: 'api618_damper_pressure_drop_limit(2.4)', result: '0.9742 %' },
    evaluate: (args) => ({ value: api618DamperPressureDropLimit(numberAt(args, 0)), notices: [] }),
  },
];

function linePulsationLimit(args: readonly Argument[]): FunctionResult {
  const pressure = numberAt(args, 1);
  const value = api618LinePulsationLimit(numberAt(args, 0), pressure, numberAt(args, 2), numberAt(args, 3));
  const { to } = API_618_LINE_PULSATION.figures;
  if (pressure <= to) return { value, notices: [] };
  const message = `the line pressure is ${Number((pressure / 1e5).toPrecision(4))} bar(a), and the limit is given up to ${to / 1e5} bar(a)`;
  const hints = ['agree a limit for this pressure, and state it as an input with its source'];
  return { value, notices: [{ code: 'VALIDITY', severity: 'warning', message, hints, argument: 1 }] };
}
