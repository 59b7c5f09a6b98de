import type { FunctionResult } from '../library/function.ts';
import { acos, asin, atan, cos, exp, log, log10, sin, tan } from '../numeric/math.ts';
import { amplitudeFactor, withAmplitude } from '../units/amplitude.ts';
import type { Amplitude, QuantityType } from '../units/dimension.ts';
import { article, describeType, isNumber, NUMBER } from '../units/dimensions.ts';
import { compareTypes, squareRootType, type Operand } from '../units/type-algebra.ts';
import type { TypeFault } from '../units/type-faults.ts';

/** Type of a call, or what is wrong with the types of its arguments, and with which of them. */
export type MathTyping =
  | {
      readonly type: QuantityType;
      /** What the argument is multiplied by on the way, where it is not 1. */
      readonly factor?: number;
    }
  | { readonly fault: TypeFault; readonly argument?: number };

/** A function of mathematics: unlike those of the library, it takes several dimensions, and its result follows them. */
export interface MathFunction {
  readonly name: string;
  readonly topic: 'mathematics';
  readonly summary: string;
  /** What it takes, in words: `x: any quantity`. The last one repeats where `repeats` is true. */
  readonly parameters: readonly { readonly name: string; readonly summary: string }[];
  readonly repeats: boolean;
  readonly returns: string;
  /** Where it has a meaning, in one sentence. */
  readonly validity: string;
  readonly example: { readonly call: string; readonly result: string };
  readonly typeOf: (args: readonly Operand[]) => MathTyping;
  /** SI values in, SI value out; as many as `parameters`, or more where they repeat. */
  readonly evaluate: (args: readonly number[]) => FunctionResult;
  /** TeX of a call, from the TeX of its arguments. */
  readonly tex: (args: readonly string[]) => string;
}

const LIST: readonly MathFunction[] = [
  {
    ...one('sqrt', 'Square root', 'any quantity whose dimension has a square root of meaning'),
    returns: 'a quantity of half the dimension; the root of 1/s² says neither cycles nor radians',
    validity: 'Arguments from zero up.',
    example: { call: 'sqrt(9 m^2)', result: '3 m' },
    typeOf: ([x]) => (x === undefined ? plain() : squareRootType(x)),
    evaluate: ([x = NaN]) =>
      x < 0 ? outside('the square root of a negative number has no real value') : value(Math.sqrt(x)),
    tex: ([x = '']) => `\\sqrt{${x}}`,
  },
  {
    ...one('abs', 'Magnitude', 'any quantity'),
    returns: 'the same quantity without its sign',
    validity: 'All arguments.',
    example: { call: 'abs(-3 psi)', result: '3 psi' },
    typeOf: ([x]) => (x === undefined ? plain() : { type: x.type }),
    evaluate: ([x = NaN]) => value(Math.abs(x)),
    tex: ([x = '']) => `\\left|${x}\\right|`,
  },
  {
    ...many('min', 'Smallest of several values'),
    example: { call: 'min(3 in, 1 ft)', result: '3 in' },
    evaluate: (args) => value(Math.min(...args)),
    tex: (args) => `\\min\\left(${args.join(',\\ ')}\\right)`,
  },
  {
    ...many('max', 'Largest of several values'),
    example: { call: 'max(3 in, 1 ft)', result: '1 ft' },
    evaluate: (args) => value(Math.max(...args)),
    tex: (args) => `\\max\\left(${args.join(',\\ ')}\\right)`,
  },
  {
    ...many('mean', 'Arithmetic mean of several values; the mean of levels is a level'),
    example: { call: 'mean(20 degC, 30 degC)', result: '25 degC' },
    evaluate: (args) => value(args.reduce((sum, x) => sum + x, 0) / args.length),
    tex: (args) => `\\operatorname{mean}\\left(${args.join(',\\ ')}\\right)`,
  },
  angular('sin', 'Sine', sin, { call: 'sin(30 deg)', result: '0.5' }),
  angular('cos', 'Cosine', cos, { call: 'cos(60 deg)', result: '0.5' }),
  angular('tan', 'Tangent', tan, { call: 'tan(45 deg)', result: '1' }),
  inverse('asin', 'Angle of a sine', asin, '\\arcsin', { call: 'asin(0.5)', result: '30 deg' }),
  inverse('acos', 'Angle of a cosine', acos, '\\arccos', { call: 'acos(0.5)', result: '60 deg' }),
  inverse('atan', 'Angle of a tangent', atan, '\\arctan', { call: 'atan(1)', result: '45 deg' }),
  {
    ...numeric('exp', 'Power of e'),
    validity: 'All arguments whose power is not too large to be held.',
    example: { call: 'exp(0)', result: '1' },
    evaluate: ([x = NaN]) => value(exp(x)),
    tex: ([x = '']) => `\\exp\\left(${x}\\right)`,
  },
  logarithm('ln', 'Natural logarithm', log, '\\ln', { call: 'ln(e)', result: '1' }),
  logarithm('log10', 'Logarithm to base 10', log10, '\\log_{10}', { call: 'log10(1000)', result: '3' }),
  whole(
    'round',
    'Nearest whole number, halves away from zero',
    roundHalfAway,
    ['\\operatorname{round}\\left(', '\\right)'],
    {
      call: 'round(2.5)',
      result: '3',
    },
  ),
  whole('floor', 'Largest whole number not above the argument', Math.floor, ['\\left\\lfloor ', '\\right\\rfloor'], {
    call: 'floor(2.7)',
    result: '2',
  }),
  whole('ceil', 'Smallest whole number not below the argument', Math.ceil, ['\\left\\lceil ', '\\right\\rceil'], {
    call: 'ceil(2.1)',
    result: '3',
  }),
  amplitudeOf('as_peak', 'peak', 'Peak of a single sine, from any of its amplitudes', {
    call: 'as_peak(4 mil pp)',
    result: '2 mil pk',
  }),
  amplitudeOf('as_peak_to_peak', 'peak to peak', 'Peak-to-peak value of a single sine, from any of its amplitudes', {
    call: 'as_peak_to_peak(2 mil pk)',
    result: '4 mil pp',
  }),
  amplitudeOf('as_rms', 'rms', 'Root mean square of a single sine, from any of its amplitudes', {
    call: 'as_rms(10 mm/s pk)',
    result: '7.0710678118655 mm/s rms',
  }),
];

/** The functions of mathematics by name. */
export const MATHEMATICS: ReadonlyMap<string, MathFunction> = new Map(LIST.map((fn) => [fn.name, fn]));

type Documented = Pick<MathFunction, 'name' | 'topic' | 'summary' | 'parameters' | 'repeats'>;
type Example = MathFunction['example'];
type RealFunction = (x: number) => number;

function one(name: string, summary: string, takes: string): Documented {
  return { name, topic: 'mathematics', summary, parameters: [{ name: 'x', summary: takes }], repeats: false };
}

function many(name: string, summary: string): Documented & Pick<MathFunction, 'returns' | 'validity' | 'typeOf'> {
  return {
    ...one(name, summary, 'quantities of one dimension: all levels, or all differences'),
    repeats: true,
    returns: 'a quantity of that dimension',
    validity: 'One argument or more.',
    typeOf: commonType,
  };
}

function numeric(name: string, summary: string): Documented & Pick<MathFunction, 'returns' | 'typeOf'> {
  return {
    ...one(name, summary, 'a number without dimension'),
    returns: 'a number',
    typeOf: ([x]) => numberWanted(x, { dimension: NUMBER, kind: 'plain' }),
  };
}

function angular(name: string, summary: string, fn: RealFunction, example: Example): MathFunction {
  return {
    ...one(name, summary, 'an angle, or a number taken as radians'),
    returns: 'a number',
    validity: 'All arguments.',
    example,
    typeOf: ([x]) => numberWanted(x, { dimension: NUMBER, kind: 'plain' }),
    evaluate: ([x = NaN]) => value(fn(x)),
    tex: ([x = '']) => `\\${name}\\left(${x}\\right)`,
  };
}

function inverse(name: string, summary: string, fn: RealFunction, head: string, example: Example): MathFunction {
  return {
    ...one(name, summary, 'a number without dimension'),
    returns: 'an angle',
    validity: name === 'atan' ? 'All arguments.' : 'Arguments from −1 to 1.',
    example,
    typeOf: ([x]) => numberWanted(x, { dimension: NUMBER, kind: 'radians' }),
    evaluate: ([x = NaN]) => {
      const angle = fn(x);
      return Number.isNaN(angle) && !Number.isNaN(x)
        ? outside(`no angle has a ${name.slice(1) === 'sin' ? 'sine' : 'cosine'} beyond 1`)
        : value(angle);
    },
    tex: ([x = '']) => `${head}\\left(${x}\\right)`,
  };
}

function logarithm(name: string, summary: string, fn: RealFunction, head: string, example: Example): MathFunction {
  return {
    ...numeric(name, summary),
    validity: 'Arguments above zero.',
    example,
    evaluate: ([x = NaN]) =>
      x <= 0 ? outside('a logarithm is taken of a number that is not above zero') : value(fn(x)),
    tex: ([x = '']) => `${head}\\left(${x}\\right)`,
  };
}

function whole(
  name: string,
  summary: string,
  fn: RealFunction,
  [open, close]: readonly [string, string],
  example: Example,
): MathFunction {
  return {
    ...numeric(name, summary),
    validity: 'Numbers without unit; the whole of a quantity would depend on its unit.',
    example,
    typeOf: ([x]) =>
      x?.type.kind === 'percent' ? wholePercent() : numberWanted(x, { dimension: NUMBER, kind: 'plain' }),
    evaluate: ([x = NaN]) => value(fn(x)),
    tex: ([x = '']) => open + x + close,
  };
}

function amplitudeOf(name: string, wanted: Amplitude, summary: string, example: Example): MathFunction {
  return {
    ...one(name, summary, 'a quantity that says its amplitude: `pk`, `pp` or `rms`'),
    returns: 'the same quantity in the other amplitude',
    validity: 'A single sine; other waves have no such factor.',
    example,
    typeOf: ([x]) => {
      const given = x?.type.amplitude;
      if (x === undefined || given === undefined) return { argument: 0, fault: unmarked() };
      return { type: withAmplitude(x.type, wanted), factor: amplitudeFactor(given, wanted) };
    },
    evaluate: ([x = NaN]) => value(x),
    tex: ([x = '']) => `\\operatorname{${name.replaceAll('_', '\\,')}}\\left(${x}\\right)`,
  };
}

function unmarked(): TypeFault {
  return {
    code: 'AMPLITUDES_DIFFER',
    message: 'the value does not say which amplitude it is',
    hints: ['write it behind the unit: `pk`, `pp` or `rms`, as in `4 mil pp`; a step says it by `to mil pp`'],
  };
}

function roundHalfAway(x: number): number {
  return Math.sign(x) * Math.round(Math.abs(x));
}

/** The type that all arguments share; the first that does not fit is the faulty one. */
function commonType(args: readonly Operand[]): MathTyping {
  const [first] = args;
  let type = first?.type ?? { dimension: NUMBER, kind: 'plain' };
  for (const [argument, operand] of args.entries()) {
    if (argument === 0) continue;
    const common = compareTypes({ type }, operand);
    if ('fault' in common) return { ...common, argument };
    ({ type } = common);
  }
  return { type };
}

function numberWanted(x: Operand | undefined, result: QuantityType): MathTyping {
  if (x === undefined || (isNumber(x.type.dimension) && x.type.kind !== 'cycles')) return { type: result };
  if (isNumber(x.type.dimension)) {
    return {
      argument: 0,
      fault: {
        code: 'CYCLES_AND_RADIANS',
        message: 'a number of turns is given, and the function counts in radians',
        hints: ['multiply turns by 2*pi: `cos(2*pi*f*t)`'],
      },
    };
  }
  return {
    argument: 0,
    fault: {
      code: 'UNIT_MISMATCH',
      message: `a number without dimension is wanted, and ${article(describeType(x.type))} is given`,
      hints: ['divide by a reference of the same dimension first'],
    },
  };
}

function wholePercent(): MathTyping {
  return {
    argument: 0,
    fault: {
      code: 'UNIT_MISMATCH',
      message: 'a percentage is given, which counts as a hundredth: 2.4 % is 0.024',
      hints: ['divide by `1 %` first to get whole percents'],
    },
  };
}

function plain(): MathTyping {
  return { type: { dimension: NUMBER, kind: 'plain' } };
}

function value(number: number): FunctionResult {
  return { value: number, notices: [] };
}

function outside(message: string): FunctionResult {
  return { value: Number.NaN, notices: [{ code: 'DOMAIN', severity: 'error', message, argument: 0 }] };
}
