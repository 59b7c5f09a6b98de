import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { evaluateSheet } from '../../../core/evaluate/evaluate-sheet.ts';
import type { Evaluation, Override } from '../../../core/evaluate/request.ts';

const example = readFileSync(
  join(import.meta.dirname, '../../../examples/tarn-hollow/discharge-run-force.yaml'),
  'utf8',
);

function evaluate(text: string, more: { overrides?: readonly Override[]; units?: 'us' | 'si' } = {}): Evaluation {
  return evaluateSheet({ entry: 'sheet.yaml', files: [{ name: 'sheet.yaml', text }], ...more });
}

/** A sheet with one section of steps; `inputs` and `steps` are written as YAML flow entries. */
function sheet(inputs: Record<string, string>, steps: Record<string, string>, checks: readonly string[] = []): string {
  return [
    'antinode: sheet/1',
    'number: T-1',
    'title: Test',
    'units: us',
    'atmosphere: 14.7 psia',
    'sources: { s: Test }',
    'inputs:',
    ...Object.entries(inputs).map(([name, value]) => `  ${name}: { value: "${value}", source: s }`),
    'sections:',
    '  - title: Steps',
    '    steps:',
    ...Object.entries(steps).map(([name, calc]) => `      ${name}: ${JSON.stringify(calc)}`),
    ...(checks.length === 0 ? [] : ['    checks:', ...checks.map((that) => `      - that: ${JSON.stringify(that)}`)]),
    '',
  ].join('\n');
}

function report({ report: made, diagnostics }: Evaluation): NonNullable<Evaluation['report']> {
  if (made === null) throw new Error(JSON.stringify(diagnostics, null, 2));
  return made;
}

describe('the hand method for a run between elbows (common practice, no source)', () => {
  // 1000 psi mean, 6 % peak to peak: 1030 and 970 psi, a differential of 60 psi; a 6-inch bore has about 28 in²; the
  // force is about 1680 lbf with the area rounded so, and 60 · π/4 · 36 = 1696.46 lbf unrounded; 1200 rpm is 20 Hz.
  const hand = report(
    evaluate(
      sheet(
        { p: '1000 psia', x: '6 %', D: '6 in', N: '1200 rpm' },
        {
          dp: 'x*p to psi',
          p_high: 'p + dp/2 to psia',
          p_low: 'p - dp/2 to psia',
          A: 'pi/4*D^2 to in^2',
          F: 'dp*A to lbf',
          F_rounded: 'dp*(28 in^2) to lbf',
          f: 'N to Hz',
        },
      ),
    ),
  );

  it.each([
    ['dp', 60],
    ['p_high', 1030],
    ['p_low', 970],
    ['A', 9 * Math.PI],
    ['F', 540 * Math.PI],
    ['F_rounded', 1680],
    ['f', 20],
  ])('%s is %d', (name, expected) => {
    expect(Math.abs(Number(hand.quantities[name]?.value) / expected - 1)).toBeLessThan(1e-12);
  });

  it('prints 1696 lbf', () => {
    expect(hand.quantities['F']?.printed).toMatchObject({ number: '1696', unit: 'lbf' });
  });
});

describe('the example sheet', () => {
  const made = report(evaluate(example));

  it('has the force, by hand: 2.4 % of 918.9 psi on a bore of 5.761 in', () => {
    const force = 0.024 * 918.9 * (Math.PI / 4) * 5.761 * 5.761;
    expect(Math.abs(Number(made.quantities['F']?.value) / force - 1)).toBeLessThan(1e-12);
  });

  it('passes its checks and is held up by one hold', () => {
    expect(made.checks.map(({ status }) => status)).toEqual(['pass', 'pass', 'pass']);
    expect(made.holds).toMatchObject([{ name: 'dp_m', path: 'inputs/dp_m' }]);
    expect(made.summary).toMatchObject({ passed: 3, failed: 0, holds: 1 });
    expect(made.summary.governing?.label).toBe('Force on run 3 below its limit');
    expect(made.summary.governing?.utilisation).toBeCloseTo(0.9427, 3);
  });

  it('warns that the gas is taken as ideal at a high pressure, and of nothing else', () => {
    expect(made.diagnostics.map(({ code, severity }) => [code, severity])).toEqual([
      ['VALIDITY', 'warning'],
      ['VALIDITY', 'warning'],
    ]);
  });

  it('gives the same report whatever the order of its keys and whatever its comments say', () => {
    const [head, ...rest] = example.split(/^(?=sections:)/m);
    const reordered = `${rest.join('')}\n# another comment\n${head?.replace(/#.*$/gm, '') ?? ''}`;
    const other = report(evaluate(reordered));
    expect(other.sheet.digest).toBe(made.sheet.digest);
    expect(
      Object.entries(other.quantities)
        .map(([name, { digest }]) => [name, digest])
        .toSorted(),
    ).toEqual(
      Object.entries(made.quantities)
        .map(([name, { digest }]) => [name, digest])
        .toSorted(),
    );
  });

  it('changes the digests of an input and of all that rests on it, and no others', () => {
    const other = report(evaluate(example.replace('905 psig', '915 psig')));
    const changed = Object.keys(made.quantities).filter(
      (name) => made.quantities[name]?.digest !== other.quantities[name]?.digest,
    );
    expect(changed).toEqual(['p_d', 'rho', 'c', 'f_half', 'L_half_2', 's_2', 'N_3', 'dp', 'F', 'P_1']);
  });

  it('shows all results in SI when asked, with the same SI values', () => {
    const si = report(evaluate(example, { units: 'si' }));
    expect(si.quantities['p_d']).toMatchObject({ unit: 'barg', printed: { number: '62.40' } });
    expect(si.quantities['F']).toMatchObject({ unit: 'N', si: made.quantities['F']?.si });
  });

  it('takes a value from outside', () => {
    const other = report(evaluate(example, { overrides: [{ name: 'dp_m', value: '3 %' }] }));
    expect(other.checks[0]).toMatchObject({ status: 'fail' });
    expect(other.quantities['dp_m']?.si).toBeCloseTo(0.03, 12);
  });
});

describe('faults', () => {
  const codes = ({ report: made, diagnostics }: Evaluation): string[] => {
    expect(made).toBeNull();
    return diagnostics.map(({ code, line, column }) => `${code} ${line}:${column}`);
  };

  it('reports every fault of a sheet in one go, each at its place', () => {
    const text = sheet(
      { p: '900 psig', T: '100 degF', L: '10 ft' },
      { a: 'p + p', b: 'T + T', c: 'p + L', d: 'lenght*2', g: 'L to psi' },
    );
    expect(codes(evaluate(text))).toEqual([
      'LEVEL_SUM 14:11',
      'LEVEL_SUM 15:11',
      'UNIT_MISMATCH 16:11',
      'NAME_UNKNOWN 17:11',
      'UNIT_MISMATCH 18:16',
    ]);
  });

  it('prints a circle of three along its way, once', () => {
    const result = evaluate(sheet({ x: '1' }, { a: 'b + x', b: 'c*2', c: 'a/3', d: 'a + 1' }));
    expect(codes(result)).toHaveLength(1);
    expect(result.diagnostics[0]?.message).toContain('`a` → `b` → `c` → `a`');
    expect(result.diagnostics[0]?.labels).toHaveLength(2);
  });

  it('does not report what follows from another fault', () => {
    expect(codes(evaluate(sheet({ x: '1' }, { a: 'x + nowhere', b: 'a*2', c: 'b + a' })))).toHaveLength(1);
  });

  it('names the divisor that is zero', () => {
    const result = evaluate(sheet({ x: '1', y: '0' }, { a: 'x/y' }));
    expect(codes(result)).toEqual(['DIVISION_BY_ZERO 13:13']);
    expect(result.diagnostics[0]?.hints.join()).toContain('y');
  });

  it('wants an atmosphere for gauge pressures', () => {
    const text = sheet({ p: '900 psig' }, { a: 'p + 1 psi' }).replace('atmosphere: 14.7 psia\n', '');
    expect(codes(evaluate(text))).toEqual(['ATMOSPHERE_MISSING 7:16']);
  });

  it.each([
    ['gauge', '0 psig'],
    ['a difference', '14.7 psi'],
    ['a length', '14.7 m'],
  ])('refuses an atmosphere that is %s', (_, value) => {
    const text = sheet({ x: '1' }, { a: 'x' }).replace('14.7 psia', value);
    expect(codes(evaluate(text))[0]).toMatch(/^(LEVEL_WANTED|ATMOSPHERE_MISSING) 5:13$/);
  });

  it('refuses an override of a name that is no input, and one that cannot be read', () => {
    const text = sheet({ pressure: '900 psig' }, { a: 'pressure + 1 psi' });
    const unknown = evaluate(text, { overrides: [{ name: 'presure', value: '1 psi' }] });
    expect(unknown.diagnostics[0]).toMatchObject({ code: 'OVERRIDE', file: '--set presure' });
    expect(unknown.diagnostics[0]?.hints[0]).toContain('`pressure`');
    const unreadable = evaluate(text, { overrides: [{ name: 'pressure', value: '1 psigg' }] });
    expect(unreadable.diagnostics[0]).toMatchObject({ code: 'UNIT_UNKNOWN', file: '--set pressure', column: 3 });
  });
});
