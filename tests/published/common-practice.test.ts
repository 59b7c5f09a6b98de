import { describe, expect, it } from 'vitest';
import { parseUnit } from '../../core/units/parse-unit.ts';
import { fromSi } from '../../core/units/convert.ts';
import { callFromSheet } from '../core/library/call.ts';
import { byId, expectRow, type Row } from './row.ts';

interface Formula {
  readonly formula: string;
  readonly unit: string;
}

function practice(id: string, formula: string, unit: string, expected: number, tolerance: number): Row<Formula> {
  return {
    id,
    source: 'common practice, no source',
    inputs: { formula, unit },
    expected,
    tolerance,
    whyTolerance: 'digits of the worked figure',
    kind: 'hand',
  };
}

/** From pulsation to shaking force, each figure as a sheet computes it. */
const CHAIN: readonly Row<Formula>[] = [
  practice('upper pressure of 1000 psi and 6 %', '1000 psia + 6 % * 1000 psia / 2', 'psia', 1030, 1e-9),
  practice('lower pressure of 1000 psi and 6 %', '1000 psia - 6 % * 1000 psia / 2', 'psia', 970, 1e-9),
  practice('differential pressure, peak to peak', '6 % * 1000 psia', 'psi', 60, 1e-9),
  practice('area of a 6-inch bore', 'pi/4 * (6 in)^2', 'in^2', 28.27, 0.005),
  practice('force, area unrounded', '6 % * 1000 psia * pi/4 * (6 in)^2', 'lbf', 1696, 0.5),
  practice('force, area rounded to 28 in²', '60 psi * 28 in^2', 'lbf', 1680, 1e-9),
  practice('1200 rpm in cycles', '1200 rpm', 'Hz', 20, 1e-12),
  practice('1200 rpm in radians', '1200 rpm to rad/s', 'rad/s', 125.66, 0.005),
];

describe('from pulsation to shaking force', () => {
  it.each(byId(CHAIN))('%s', (_, row) => {
    const { value, diagnostics } = callFromSheet(row.inputs.formula);
    expect(diagnostics).toEqual([]);
    const unit = parseUnit(row.inputs.unit);
    if (unit === null) throw new Error(row.inputs.unit);
    expectRow(fromSi(value, unit, {}), row);
  });
});
