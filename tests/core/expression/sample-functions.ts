import type { LibraryFunction, Parameter } from '../../../core/library/function.ts';
import { FREQUENCY, LENGTH, MOLAR_MASS, PRESSURE, SPEED } from '../../../core/units/dimensions.ts';

const speed: Parameter = {
  name: 'c',
  symbol: 'c',
  summary: 'speed of sound',
  kind: { takes: 'quantity', dimension: SPEED, kind: 'plain', unit: 'm/s' },
  range: { above: 0 },
};
const documented = { summary: '', formula: '', validity: '', source: '', example: { call: '', result: '' } };

/** c/(4 L) times an odd number, with the ranges and notices that a function of the library may have. */
export const QUARTER: LibraryFunction = {
  ...documented,
  name: 'quarter_wave',
  topic: 'acoustics',
  symbol: 'f_{1/4}',
  parameters: [
    speed,
    {
      name: 'L',
      symbol: 'L',
      summary: '',
      kind: { takes: 'quantity', dimension: LENGTH, kind: 'plain', unit: 'm' },
      range: { above: 0 },
    },
    {
      name: 'n',
      symbol: 'n',
      summary: '',
      kind: { takes: 'number', integer: true },
      range: { from: 1, to: 99 },
      optional: true,
    },
  ],
  returns: { dimension: FREQUENCY, kind: 'cycles', unit: 'Hz', summary: '' },
  evaluate: ([c, length, n = 1]) => {
    if (typeof c !== 'number' || typeof length !== 'number' || typeof n !== 'number')
      throw new Error('wrong arguments');
    const value = (n * c) / (4 * length);
    const notices =
      n % 2 === 0 ? [{ code: 'VALIDITY', severity: 'warning', message: 'n is even', argument: 2 } as const] : [];
    return { value, notices };
  },
};

export const BORE: LibraryFunction = {
  ...documented,
  name: 'pipe_bore',
  topic: 'pipe',
  symbol: 'pipe bore',
  parameters: [
    { name: 'nps', symbol: 'NPS', summary: '', kind: { takes: 'size' } },
    { name: 'schedule', symbol: 'S', summary: '', kind: { takes: 'text', examples: ['Sch 80'] } },
  ],
  returns: { dimension: LENGTH, kind: 'plain', unit: 'in', summary: '' },
  evaluate: ([size, schedule]) =>
    (size === 6 || size === '6') && schedule === 'Sch 80'
      ? { value: 5.761 * 0.0254, notices: [] }
      : { value: Number.NaN, notices: [{ code: 'LOOKUP_MISSING', severity: 'error', message: 'no such pipe' }] },
};

export const MOLAR: LibraryFunction = {
  ...documented,
  name: 'molar_mass',
  topic: 'gas',
  symbol: 'M',
  parameters: [{ name: 'gas', symbol: 'g', summary: '', kind: { takes: 'gas' } }],
  returns: { dimension: MOLAR_MASS, kind: 'plain', unit: 'kg/kmol', summary: '' },
  evaluate: ([gas]) => ({
    value: typeof gas === 'object' ? 0.01604 * gas.moleFractions.size : Number.NaN,
    notices: [],
  }),
};

/** Takes an absolute pressure and a rate in radians per second. */
export const LEVELLED: LibraryFunction = {
  ...documented,
  name: 'levelled',
  topic: 'limits',
  symbol: 'X',
  parameters: [
    {
      name: 'p',
      symbol: 'p',
      summary: '',
      kind: { takes: 'quantity', dimension: PRESSURE, kind: 'level', unit: 'Paa' },
    },
    {
      name: 'omega',
      symbol: '\\omega',
      summary: '',
      kind: { takes: 'quantity', dimension: FREQUENCY, kind: 'radians', unit: 'rad/s' },
    },
  ],
  returns: { dimension: FREQUENCY, kind: 'radians', unit: 'rad/s', summary: '' },
  evaluate: ([, omega]) => ({ value: typeof omega === 'number' ? omega : Number.NaN, notices: [] }),
};

export const SAMPLES = [QUARTER, BORE, MOLAR, LEVELLED];
