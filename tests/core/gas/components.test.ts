import { describe, expect, it } from 'vitest';
import { COMPONENTS, HEAT_CAPACITY_RANGE } from '../../../core/gas/data/components.ts';
import { COMPONENT_IDS, componentById, findComponent } from '../../../core/gas/find-component.ts';
import type { GasModel } from '../../../core/gas/gas-model.ts';
import { idealHeatCapacityCp } from '../../../core/gas/ideal-gas.ts';

/** Standard atomic weights, abridged to five digits: IUPAC 2021 (Prohaska et al., Pure Appl. Chem. 94 (2022), 573). */
const ATOMIC_WEIGHT: Readonly<Record<string, number>> = {
  H: 1.008,
  He: 4.0026,
  C: 12.011,
  N: 14.007,
  O: 15.999,
  F: 18.998,
  S: 32.06,
  Cl: 35.45,
  Ar: 39.95,
};

function massOf(formula: string): number {
  return [...formula.matchAll(/([A-Z][a-z]?)(\d*)/g)].reduce(
    (sum, [, element = '', count = '']) =>
      sum + (ATOMIC_WEIGHT[element] ?? Number.NaN) * (count === '' ? 1 : Number(count)),
    0,
  );
}

/** Molar heat capacity of the pure component as an ideal gas, J/(mol K). */
function molarCp(id: string, temperature: number): number {
  const gas: GasModel = { name: id, method: 'ideal', moleFractions: new Map([[id, 1]]) };
  return (idealHeatCapacityCp(gas, temperature) * componentById(id).molarMass) / 1000;
}

describe('the components', () => {
  it('have the ids that sheets rely on', () => {
    const wanted =
      'methane ethane propane isobutane n_butane isopentane n_pentane n_hexane n_heptane n_octane n_nonane n_decane nitrogen carbon_dioxide carbon_monoxide hydrogen_sulfide hydrogen oxygen argon helium water neopentane ethylene propylene benzene ammonia sulfur_dioxide'.split(
        ' ',
      );
    expect(COMPONENT_IDS).toEqual(expect.arrayContaining(wanted));
    expect(new Set(COMPONENT_IDS).size).toBe(34);
  });

  it('are found by id, name and synonym, each by no other name', () => {
    for (const component of COMPONENTS)
      for (const name of [component.id, component.name, ...component.synonyms])
        expect(findComponent(name)).toBe(component);
  });

  it.each([
    ['C1', 'methane'],
    ['CH4', 'methane'],
    ['iC4', 'isobutane'],
    ['i-butane', 'isobutane'],
    ['n-Butane', 'n_butane'],
    ['nC5', 'n_pentane'],
    ['Carbon Dioxide', 'carbon_dioxide'],
    ['co2', 'carbon_dioxide'],
    ['CO', 'carbon_monoxide'],
    ['H2S', 'hydrogen_sulfide'],
    ['hydrogen sulphide', 'hydrogen_sulfide'],
  ])('%s is %s', (text, id) => {
    expect(findComponent(text)?.id).toBe(id);
  });

  it.each(COMPONENTS.map((component) => [component.id, component] as const))(
    '%s has the molar mass of its formula',
    (_, { formula, molarMass }) => {
      // 0.02 %: the reference equations carry atomic weights of their own year.
      expect(Math.abs(molarMass / massOf(formula) - 1)).toBeLessThan(2e-4);
    },
  );

  it.each(COMPONENTS.map(({ id }) => [id] as const))('%s has a heat capacity that is positive and smooth', (id) => {
    let before = molarCp(id, HEAT_CAPACITY_RANGE.from);
    for (let temperature = HEAT_CAPACITY_RANGE.from + 10; temperature <= HEAT_CAPACITY_RANGE.to; temperature += 10) {
      const here = molarCp(id, temperature);
      expect(here).toBeGreaterThan(20.7);
      expect(Math.abs(here / before - 1)).toBeLessThan(0.06);
      before = here;
    }
  });

  it.each(COMPONENTS.map(({ id }) => [id] as const))(
    '%s keeps the heat capacity of the nearer end outside its range',
    (id) => {
      expect(molarCp(id, 50)).toBe(molarCp(id, HEAT_CAPACITY_RANGE.from));
      expect(molarCp(id, 3000)).toBe(molarCp(id, HEAT_CAPACITY_RANGE.to));
    },
  );
});
