import { describe, it } from 'vitest';
import {
  api618DamperPressureDropLimit,
  api618FlangePulsationLimit,
  api618LinePulsationLimit,
} from '../../core/limits/api-618.ts';
import { byId, expectRow, type Row } from './row.ts';

interface Line {
  readonly soundSpeed: number;
  readonly pressure: number;
  readonly bore: number;
  readonly frequency: number;
  readonly form?: 'si' | 'us';
}

const CLAUSE = 'API Standard 618, 5th ed. (2007), 7.9.4.2.5.2.2, formula from memory';
const PSI = 6894.757293168361;

function independent(id: string, inputs: Line, expected: number): Row<Line> {
  const source = `${CLAUSE}; number by separately written code`;
  return { id, source, inputs, expected, tolerance: 1e-9, whyTolerance: 'printed digits', kind: 'independent' };
}

/** Limits in percent. */
const LINE: readonly Row<Line>[] = [
  {
    id: 'all references, 100 bar(a), 100 mm, 16 Hz',
    source: `${CLAUSE}: 400 / sqrt(100 · 100 · 16) = 1 %, by hand`,
    inputs: { soundSpeed: 350, pressure: 100e5, bore: 0.1, frequency: 16 },
    expected: 1,
    tolerance: 1e-12,
    whyTolerance: 'double precision',
    kind: 'hand',
  },
  {
    id: 'US form, 1150 ft/s, 1000 psia, 9 in, 25 Hz',
    source: `${CLAUSE}: 300 / sqrt(1000 · 9 · 25) = 0.632456 %, by hand`,
    inputs: { soundSpeed: 1150 * 0.3048, pressure: 1000 * PSI, bore: 9 * 0.0254, frequency: 25, form: 'us' },
    expected: 0.632456,
    tolerance: 1e-6,
    whyTolerance: 'printed digits',
    kind: 'hand',
  },
  {
    id: 'the same in the SI form',
    source: `${CLAUSE}: the two forms are rounded apart from each other`,
    inputs: { soundSpeed: 1150 * 0.3048, pressure: 1000 * PSI, bore: 9 * 0.0254, frequency: 25 },
    expected: 0.632456,
    tolerance: 0.0083 * 0.632456,
    whyTolerance: '300 of the US form would have to be 302.5 to agree exactly',
    kind: 'hand',
  },
  independent(
    '60 bar(a), 193.7 mm, 25 Hz',
    { soundSpeed: 400, pressure: 60e5, bore: 0.1937, frequency: 25 },
    0.7933147423,
  ),
  independent(
    '66 bar(a), 180 mm, 12.5 Hz',
    { soundSpeed: 400, pressure: 66e5, bore: 0.18, frequency: 12.5 },
    1.1096671714,
  ),
  independent(
    '66 bar(a), 180 mm, 100 Hz',
    { soundSpeed: 400, pressure: 66e5, bore: 0.18, frequency: 100 },
    0.3923265909,
  ),
  independent(
    '66 bar(a), 180 mm, 250 Hz',
    { soundSpeed: 400, pressure: 66e5, bore: 0.18, frequency: 250 },
    0.2481291228,
  ),
  {
    id: 'below 3.5 bar(a)',
    source: `${CLAUSE}: 400 / sqrt(3.5 · 100 · 16) = 5.34522 % of 3.5 bar(a), so 10.69045 % of 1.75 bar(a), by hand`,
    inputs: { soundSpeed: 350, pressure: 1.75e5, bore: 0.1, frequency: 16 },
    expected: 10.69045,
    tolerance: 1e-5,
    whyTolerance: 'printed digits',
    kind: 'hand',
  },
];

interface Ratio {
  readonly ratio: number;
  readonly limit: (ratio: number) => number;
}

function atRatio(id: string, inputs: Ratio, expected: number): Row<Ratio> {
  const source = 'API Standard 618, 5th ed. (2007), 7.9.4.2.5, formula from memory; number by separately written code';
  return { id, source, inputs, expected, tolerance: 1e-12, whyTolerance: 'double precision', kind: 'independent' };
}

const RATIOS: readonly Row<Ratio>[] = [
  atRatio('cylinder flange, R = 2.4', { ratio: 2.4, limit: api618FlangePulsationLimit }, 7),
  atRatio('cylinder flange, R = 2', { ratio: 2, limit: api618FlangePulsationLimit }, 6),
  atRatio('damper pressure drop, R = 2.4', { ratio: 2.4, limit: api618DamperPressureDropLimit }, 0.9741666666666665),
  atRatio('damper pressure drop, R = 1.05', { ratio: 1.05, limit: api618DamperPressureDropLimit }, 0.25),
];

describe('line-side pulsation, percent', () => {
  it.each(byId(LINE))('%s', (_, row) => {
    const { soundSpeed, pressure, bore, frequency, form } = row.inputs;
    expectRow(100 * api618LinePulsationLimit(soundSpeed, pressure, bore, frequency, form), row);
  });
});

describe('limits by pressure ratio, percent', () => {
  it.each(byId(RATIOS))('%s', (_, row) => expectRow(100 * row.inputs.limit(row.inputs.ratio), row));
});
