import { describe, expect, it } from 'vitest';
import { callFromSheet } from './call.ts';

/** Code, underlined text, and the rest of the only diagnostic of a call. */
function onlyFault(text: string): {
  code: string;
  severity: string;
  at: string;
  message: string;
  hints: readonly string[];
} {
  const { diagnostics } = callFromSheet(text);
  expect(diagnostics).toHaveLength(1);
  const [first] = diagnostics;
  if (first === undefined) throw new Error('no diagnostic');
  const { code, severity, span, message, hints } = first;
  return { code, severity, at: text.slice(span.start, span.end), message, hints };
}

describe('pipe look-ups in a sheet', () => {
  it('names the schedules that a size has', () => {
    const fault = onlyFault("pipe_bore(6, 'Sch 60')");
    expect(fault).toMatchObject({ code: 'LOOKUP_MISSING', severity: 'error', at: "'Sch 60'" });
    expect(fault.message).toBe('NPS 6 has no schedule `Sch 60`');
    expect(fault.hints).toEqual([
      'the schedules of NPS 6 are 5, 10, 40, STD, 80, XS, 120, 160, XXS, 5S, 10S, 40S, 80S',
    ]);
  });

  it('names the sizes on both sides of one that does not exist', () => {
    const fault = onlyFault('pipe_outside_diameter(7)');
    expect(fault).toMatchObject({ code: 'LOOKUP_MISSING', at: '7', message: 'there is no pipe of NPS 7' });
    expect(fault.hints).toEqual(['the nearest sizes are NPS 6 and 8']);
  });
});

describe('gas functions in a sheet', () => {
  it('refuse a method that is not available, and never give an ideal value in its place', () => {
    for (const name of [
      'density',
      'speed_of_sound',
      'compressibility_factor',
      'heat_capacity_cp',
      'heat_capacity_cv',
      'isentropic_exponent',
    ]) {
      const { value } = callFromSheet(`${name}(real, 10 bara, 300 K)`);
      expect(value).toBeNaN();
      const fault = onlyFault(`${name}(real, 10 bara, 300 K)`);
      expect(fault).toMatchObject({ code: 'GAS_METHOD', severity: 'error', at: 'real' });
      expect(fault.hints.join()).toContain('method: ideal');
    }
  });

  it('know the molar mass of a gas whatever its method', () => {
    expect(callFromSheet('molar_mass(real)')).toMatchObject({ value: 0.0160428, diagnostics: [] });
  });

  it('warn above the pressure up to which a gas may count as ideal', () => {
    const fault = onlyFault('speed_of_sound(methane, 62.4 bara, 300 K)');
    expect(fault).toMatchObject({ code: 'VALIDITY', severity: 'warning', at: '62.4 bara' });
    expect(callFromSheet('speed_of_sound(methane, 20 bara, 300 K)').diagnostics).toEqual([]);
  });

  it('warn outside the range of the heat capacities, where they count', () => {
    const fault = onlyFault('heat_capacity_cp(methane, 1 bara, 650 K)');
    expect(fault).toMatchObject({ code: 'VALIDITY', severity: 'warning', at: '650 K' });
    expect(callFromSheet('density(methane, 1 bara, 650 K)').diagnostics).toEqual([]);
  });

  it('want an absolute pressure', () => {
    expect(onlyFault('density(methane, 10 bar, 300 K)')).toMatchObject({ code: 'LEVEL_WANTED', at: '10 bar' });
    expect(callFromSheet('density(methane, 10 barg, 300 K)').value).toBeCloseTo(
      callFromSheet('density(methane, 11.01325 bara, 300 K)').value,
      9,
    );
  });
});

describe('acoustic lengths in a sheet', () => {
  it('refuse an even multiple of a quarter wave', () => {
    const fault = onlyFault('quarter_wave_frequency(400 m/s, 5 m, 2)');
    expect(fault).toMatchObject({ code: 'DOMAIN', severity: 'error', at: '2' });
    expect(fault.hints.join()).toContain('half_wave_frequency');
  });

  it('refuse a length of nothing', () => {
    expect(onlyFault('half_wave_frequency(400 m/s, 0 m, 1)')).toMatchObject({ code: 'DOMAIN', at: '0 m' });
  });

  it('warn where a neck is too long to count as lumped', () => {
    const fault = onlyFault('helmholtz_frequency(400 m/s, 0.005 m^2, 3 m, 0.01 m^3)');
    expect(fault).toMatchObject({ code: 'VALIDITY', severity: 'warning', at: '3 m' });
  });

  it('warn where a volume is too large to count as lumped', () => {
    const fault = onlyFault('helmholtz_frequency(400 m/s, 0.2 m^2, 0.4 m, 1 m^3)');
    expect(fault).toMatchObject({ code: 'VALIDITY', severity: 'warning', at: '1 m^3' });
  });
});

describe('limits in a sheet', () => {
  it('warn above the highest pressure of the standard', () => {
    const fault = onlyFault('api618_line_pulsation_limit(400 m/s, 400 bara, 100 mm, 20 Hz)');
    expect(fault).toMatchObject({ code: 'VALIDITY', severity: 'warning', at: '400 bara' });
  });

  it('give a percentage that makes a pressure difference of a line pressure', () => {
    const { value, type } = callFromSheet(
      'api618_line_pulsation_limit(400 m/s, 60 bara, 193.7 mm, 25 Hz) * 60 bara to mbar',
    );
    expect(type?.kind).toBe('difference');
    expect(value).toBeCloseTo(47_598.88, 1);
  });

  it('refuse a pressure ratio below one', () => {
    expect(onlyFault('api618_flange_pulsation_limit(0.9)')).toMatchObject({ code: 'DOMAIN', at: '0.9' });
  });
});
