import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildGas } from '../../../core/gas/build-gas.ts';
import { COMPONENT_IDS } from '../../../core/gas/find-component.ts';

function amounts(shares: Readonly<Record<string, number>>): { component: string; value: number }[] {
  return Object.entries(shares).map(([component, value]) => ({ component, value }));
}

describe('building a gas', () => {
  it('takes the real-gas method where none is named', () => {
    const { gas, faults } = buildGas('residue', undefined, amounts({ methane: 0.9, ethane: 0.1 }));
    expect(faults).toEqual([]);
    expect(gas?.method).toBe('gerg2008');
    expect([...(gas?.moleFractions ?? [])]).toEqual([
      ['methane', 0.9],
      ['ethane', 0.1],
    ]);
  });

  it('knows components by synonyms, and leaves out what is not there', () => {
    const { gas } = buildGas('residue', 'ideal', amounts({ C1: 0.95, iC4: 0.05, N2: 0 }));
    expect([...(gas?.moleFractions.keys() ?? [])]).toEqual(['methane', 'isobutane']);
  });

  it('scales the rounding of an analysis away, with a note', () => {
    const { gas, faults } = buildGas('residue', 'ideal', amounts({ methane: 0.952, ethane: 0.05 }));
    expect(faults).toEqual([
      {
        code: 'GAS_FRACTIONS',
        severity: 'warning',
        message: 'the shares of the components add up to 100.2 %, and are scaled to 100 %',
        hints: [],
      },
    ]);
    expect(gas?.moleFractions.get('methane')).toBeCloseTo(0.952 / 1.002, 12);
  });

  it('refuses shares that do not add up', () => {
    const { gas, faults } = buildGas('residue', 'ideal', amounts({ methane: 0.9, ethane: 0.09 }));
    expect(gas).toBeUndefined();
    expect(faults).toMatchObject([
      { code: 'GAS_FRACTIONS', severity: 'error', message: 'the shares of the components add up to 99 %' },
    ]);
    expect(buildGas('none', 'ideal', []).faults).toMatchObject([{ code: 'GAS_FRACTIONS', severity: 'error' }]);
  });

  it('sees where the percent sign was left out', () => {
    const { faults } = buildGas('residue', 'ideal', amounts({ methane: 91.3, ethane: 8.7 }));
    expect(faults.map(({ index, hints }) => [index, ...hints])).toEqual([
      [0, 'write mole percent with its sign: `91.3 %`'],
      [1, 'write mole percent with its sign: `8.7 %`'],
    ]);
  });

  it('does not take a share that is too large for a missing sign', () => {
    const { faults } = buildGas('residue', 'ideal', amounts({ methane: 1.5 }));
    expect(faults).toMatchObject([{ code: 'GAS_FRACTIONS', severity: 'error', index: 0, hints: [] }]);
  });

  it('takes any word for a name and nothing more', () => {
    for (const word of ['constructor', '__proto__', 'toString', ''])
      expect(buildGas('residue', 'ideal', [{ component: word, value: 1 }]).faults).toMatchObject([
        { code: 'GAS_COMPONENT', unknown: { name: word } },
      ]);
  });

  it('refuses a negative share', () => {
    const { faults } = buildGas('residue', 'ideal', amounts({ methane: 1.004, ethane: -0.004 }));
    expect(faults).toMatchObject([{ code: 'GAS_FRACTIONS', index: 1, message: 'the share of `ethane` is negative' }]);
  });

  it('refuses a component that is named twice under two names', () => {
    const { faults } = buildGas('residue', 'ideal', amounts({ methane: 0.5, C1: 0.5 }));
    expect(faults).toMatchObject([
      { code: 'GAS_COMPONENT', index: 1, message: '`C1` is given twice: `methane` is the same component' },
    ]);
  });

  it('hands an unknown component on with the names that are known', () => {
    const { faults } = buildGas('residue', 'ideal', amounts({ metane: 1 }));
    expect(faults).toEqual([
      {
        code: 'GAS_COMPONENT',
        severity: 'error',
        index: 0,
        message: 'no component is named `metane`',
        hints: [],
        unknown: { name: 'metane', known: COMPONENT_IDS },
      },
    ]);
  });

  it('asks which isomer is meant', () => {
    const { faults } = buildGas('residue', 'ideal', amounts({ methane: 0.9, butane: 0.1 }));
    expect(faults).toMatchObject([{ code: 'GAS_COMPONENT', index: 1, hints: ['write `n_butane` or `isobutane`'] }]);
  });

  it('refuses a method that there is not, and finds all faults in one go', () => {
    const { gas, faults } = buildGas('residue', 'gerg', amounts({ metane: 0.5, ethane: -1 }));
    expect(gas).toBeUndefined();
    expect(faults.map(({ code }) => code)).toEqual(['GAS_METHOD', 'GAS_COMPONENT', 'GAS_FRACTIONS']);
    expect(faults[0]?.unknown?.known).toContain('ideal');
  });

  it('always gives fractions that add up to one', () => {
    const share = fc.double({ min: 0.01, max: 1, noNaN: true });
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.constantFrom(...COMPONENT_IDS), { minLength: 1 }),
        fc.array(share, { minLength: 40, maxLength: 40 }),
        (ids, shares) => {
          const total = ids.reduce((sum, _, i) => sum + (shares[i] ?? 0), 0);
          const { gas } = buildGas(
            'any',
            'ideal',
            ids.map((component, i) => ({ component, value: (shares[i] ?? 0) / total })),
          );
          const sum = [...(gas?.moleFractions.values() ?? [])].reduce((a, b) => a + b, 0);
          expect(sum).toBeCloseTo(1, 12);
        },
      ),
    );
  });
});
