import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { LIBRARY } from '../../../core/library/catalogue.ts';
import type { LibraryFunction, Parameter } from '../../../core/library/function.ts';
import { sameDimension } from '../../../core/units/dimensions.ts';
import { parseUnit } from '../../../core/units/parse-unit.ts';
import { printQuantity } from '../../../core/units/print.ts';
import { callFromSheet } from './call.ts';

const FUNCTIONS = [...LIBRARY.values()].map((fn) => [fn.name, fn] as const);

/** Names and parameters that sheets rely on: changing one breaks every sheet that calls it. */
const SIGNATURES = [
  'pipe_bore(nps, schedule)',
  'pipe_outside_diameter(nps)',
  'pipe_wall(nps, schedule)',
  'molar_mass(gas)',
  'density(gas, p, T)',
  'compressibility_factor(gas, p, T)',
  'heat_capacity_cp(gas, p, T)',
  'heat_capacity_cv(gas, p, T)',
  'isentropic_exponent(gas, p, T)',
  'speed_of_sound(gas, p, T)',
  'quarter_wave_frequency(c, L, n)',
  'half_wave_frequency(c, L, n)',
  'helmholtz_frequency(c, A, L, V)',
  'choke_filter_frequency(c, A, L, V_1, V_2)',
  'flanged_end_correction(d)',
  'unflanged_end_correction(d)',
  'wavelength(c, f)',
  'api618_line_pulsation_limit(c, p_line, bore, f)',
  'api618_flange_pulsation_limit(ratio)',
  'api618_damper_pressure_drop_limit(ratio)',
];

/** A word is set upright by the report; all else is TeX as it stands. */
function tex(symbol: string): string {
  return /^[A-Za-z][A-Za-z0-9 ]+$/.test(symbol) ? `\\text{${symbol}}` : symbol;
}

function typeset(formula: string): string {
  return katex.renderToString(formula, { throwOnError: true, strict: 'error', trust: false });
}

function unitOf(parameter: Parameter): ReturnType<typeof parseUnit> | undefined {
  return parameter.kind.takes === 'quantity' ? parseUnit(parameter.kind.unit) : undefined;
}

describe('the catalogue', () => {
  it('has the functions that sheets rely on, with their parameters in order', () => {
    const signatures = FUNCTIONS.map(
      ([name, { parameters }]) => `${name}(${parameters.map((p) => p.name).join(', ')})`,
    );
    expect(signatures.toSorted()).toEqual(SIGNATURES.toSorted());
  });

  it.each(FUNCTIONS)('%s says what it is, where it holds and where it comes from', (_name, fn) => {
    for (const text of [fn.summary, fn.validity, fn.source, fn.returns.summary]) expect(text.length).toBeGreaterThan(3);
    for (const parameter of fn.parameters) expect(parameter.summary.length).toBeGreaterThan(3);
    expect(fn.validity).toMatch(/\.$/);
    expect(fn.summary).not.toMatch(/\.$/);
  });

  it.each(FUNCTIONS)('%s is typeset without a complaint', (_name, fn) => {
    expect(typeset(fn.formula)).toContain('katex');
    expect(typeset(tex(fn.symbol))).toContain('katex');
    for (const parameter of fn.parameters) expect(typeset(parameter.symbol)).toContain('katex');
  });

  it.each(FUNCTIONS)('%s names units that fit its parameters and its result', (_name, fn) => {
    for (const parameter of fn.parameters) {
      if (parameter.kind.takes !== 'quantity') continue;
      const unit = unitOf(parameter);
      if (unit === undefined || unit === null) throw new Error(`no unit for ${parameter.name}`);
      expect(sameDimension(unit.dimension, parameter.kind.dimension)).toBe(true);
      // K is a level where one is wanted, so it suits an absolute temperature.
      expect([parameter.kind.kind, 'open']).toContain(unit.kind);
      expect([unit.gauge, unit.shift]).toEqual([false, 0]);
    }
    const unit = parseUnit(fn.returns.unit);
    expect(unit?.kind).toBe(fn.returns.kind);
    expect(unit !== null && sameDimension(unit.dimension, fn.returns.dimension)).toBe(true);
  });

  it.each(FUNCTIONS)('%s gives what its example says', (_name, fn) => {
    const { value, type, diagnostics } = callFromSheet(fn.example.call);
    expect(diagnostics).toEqual([]);
    expect(type).toEqual({ dimension: fn.returns.dimension, kind: fn.returns.kind });
    expect(shown(value, fn)).toBe(fn.example.result);
  });
});

function shown(value: number, fn: LibraryFunction): string {
  const unit = parseUnit(fn.returns.unit);
  if (unit === null) throw new Error(fn.returns.unit);
  const { number, unit: text } = printQuantity(value, unit);
  return text === '' ? number : `${number} ${text}`;
}
