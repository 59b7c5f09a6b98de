import { describe, it } from 'vitest';
import { buildGas } from '../../core/gas/build-gas.ts';
import type { GasModel } from '../../core/gas/gas-model.ts';
import { idealDensity, idealHeatCapacityCp, idealHeatCapacityCv, idealSpeedOfSound } from '../../core/gas/ideal-gas.ts';
import { molarMass } from '../../core/gas/molar-mass.ts';
import { byId, expectRow, type Row } from './row.ts';

type Shares = Readonly<Record<string, number>>;

/** Main constituents of dry air by ISO 2533:1975, table 2; neon, helium, krypton, xenon and others make up 0.003 %. */
const AIR: Shares = { nitrogen: 0.78084, oxygen: 0.209476, argon: 0.00934, carbon_dioxide: 0.000314 };

function ideal(shares: Shares): GasModel {
  const amounts = Object.entries(shares).map(([component, value]) => ({ component, value }));
  const { gas, faults } = buildGas('gas', 'ideal', amounts);
  if (gas === undefined) throw new Error(faults.map(({ message }) => message).join('; '));
  return gas;
}

interface State {
  readonly gas: Shares;
  readonly pressure: number;
  readonly temperature: number;
}

const ATMOSPHERE = 101_325;

function pure(component: string, temperature: number): State {
  return { gas: { [component]: 1 }, pressure: ATMOSPHERE, temperature };
}

function air(temperature: number): State {
  return { gas: AIR, pressure: ATMOSPHERE, temperature };
}

const MOLAR_MASSES: readonly Row<Shares>[] = [
  {
    id: 'dry air',
    source: 'ISO 2533:1975, Standard atmosphere, M = 28.964420 kg/kmol',
    inputs: AIR,
    expected: 28.96442,
    tolerance: 0.0015,
    whyTolerance: 'the rare gases are left out (0.003 %), and the standard uses the atomic weights of 1961',
    kind: 'published',
  },
  {
    id: 'AGA sample gas, Gulf Coast',
    source: 'AGA Report No. 8 (2017), molar mass of the sample gas by the DETAIL method',
    inputs: {
      methane: 0.965222,
      nitrogen: 0.002595,
      carbon_dioxide: 0.005956,
      ethane: 0.018186,
      propane: 0.004596,
      isobutane: 0.000977,
      n_butane: 0.001007,
      isopentane: 0.000473,
      n_pentane: 0.000324,
      n_hexane: 0.000664,
    },
    expected: 16.7989,
    tolerance: 0.0006,
    whyTolerance: 'the report rounds the molar masses of hydrocarbons to 0.001',
    kind: 'published',
  },
  {
    id: 'AGA sample gas, Ekofisk',
    source: 'AGA Report No. 8 (2017), molar mass of the sample gas by the DETAIL method',
    inputs: {
      methane: 0.859063,
      nitrogen: 0.010068,
      carbon_dioxide: 0.014954,
      ethane: 0.084919,
      propane: 0.023015,
      isobutane: 0.003486,
      n_butane: 0.003506,
      isopentane: 0.000509,
      n_pentane: 0.00048,
    },
    expected: 18.7677,
    tolerance: 0.0006,
    whyTolerance: 'the report rounds the molar masses of hydrocarbons to 0.001',
    kind: 'published',
  },
];

const DENSITIES: readonly Row<State>[] = [
  {
    id: 'dry air at sea level, 15 °C',
    source: 'ISO 2533:1975, Standard atmosphere, density at sea level 1.225 kg/m³',
    inputs: air(288.15),
    expected: 1.225,
    tolerance: 0.0001,
    whyTolerance: 'the standard is an ideal gas with its own R (8.31432) and molar mass',
    kind: 'published',
  },
  {
    id: 'argon at 0 °C and 1 atm',
    source: 'CODATA 2018, molar volume of an ideal gas 22.413 969 54 L/mol; atomic weight of argon 39.948',
    inputs: pure('argon', 273.15),
    expected: 39.948 / 22.41396954,
    tolerance: 1e-8,
    whyTolerance: 'digits of the published molar volume',
    kind: 'published',
  },
  {
    id: 'methane at 300 K and 1 atm',
    source: 'Setzmann and Wagner (1991), reference equation of methane: 0.040691 mol/L times 16.0428 g/mol',
    inputs: pure('methane', 300),
    expected: 0.040691 * 16.0428,
    tolerance: 0.002 * 0.6528,
    whyTolerance: 'methane at 1 atm is 0.18 % denser than as an ideal gas (Z = 0.9982)',
    kind: 'independent',
  },
  {
    id: 'nitrogen at 300 K and 1 atm',
    source: 'Span et al. (2000), reference equation of nitrogen: 0.040629 mol/L times 28.01348 g/mol',
    inputs: pure('nitrogen', 300),
    expected: 0.040629 * 28.01348,
    tolerance: 0.0005 * 1.138,
    whyTolerance: 'nitrogen at 1 atm differs by 0.02 % from an ideal gas, and the value has five digits',
    kind: 'independent',
  },
];

const SOUND: readonly Row<State>[] = [
  {
    id: 'dry air at 15 °C',
    source: 'ISO 2533:1975, Standard atmosphere, speed of sound at sea level 340.294 m/s',
    inputs: air(288.15),
    expected: 340.294,
    tolerance: 0.1,
    whyTolerance: 'the standard takes kappa = 1.4 exactly; that of the mixture is 1.4003',
    kind: 'published',
  },
  {
    id: 'dry air at 0 °C',
    source: 'ISO 2533:1975, 20.046796 times the root of T: 331.3 m/s',
    inputs: air(273.15),
    expected: 20.046796 * Math.sqrt(273.15),
    tolerance: 0.1,
    whyTolerance: 'the standard takes kappa = 1.4 exactly',
    kind: 'published',
  },
  {
    id: 'dry air at 0 °C, handbook',
    source: 'CRC Handbook of Chemistry and Physics, speed of sound in dry air, 331.45 m/s (from memory)',
    inputs: air(273.15),
    expected: 331.45,
    tolerance: 0.15,
    whyTolerance: 'the handbook value is that of real air, 0.03 % above the ideal gas; others print 331.3',
    kind: 'published',
  },
  {
    id: 'dry air at 20 °C, handbook',
    source: 'CRC Handbook of Chemistry and Physics, speed of sound in dry air, 343.2 m/s (from memory)',
    inputs: air(293.15),
    expected: 343.2,
    tolerance: 0.15,
    whyTolerance: 'printed to 0.1 m/s; real air is 0.03 % above the ideal gas',
    kind: 'published',
  },
  {
    id: 'methane at 0 °C, handbook',
    source: 'CRC Handbook of Chemistry and Physics, speed of sound in methane, 430 m/s (from memory)',
    inputs: pure('methane', 273.15),
    expected: 430,
    tolerance: 2,
    whyTolerance: 'printed to 1 m/s; methane at 1 atm is 0.2 % below the ideal gas',
    kind: 'published',
  },
  {
    id: 'methane at 20 °C',
    source: 'Setzmann and Wagner (1991), reference equation of methane, at 1 atm',
    inputs: pure('methane', 293.15),
    expected: 445.011,
    tolerance: 0.9,
    whyTolerance: 'methane at 1 atm is up to 0.2 % below the ideal gas',
    kind: 'independent',
  },
  {
    id: 'methane at 300 K',
    source: 'Setzmann and Wagner (1991), reference equation of methane, at 1 atm',
    inputs: pure('methane', 300),
    expected: 449.738,
    tolerance: 0.9,
    whyTolerance: 'methane at 1 atm is up to 0.2 % below the ideal gas',
    kind: 'independent',
  },
  {
    id: 'nitrogen at 0 °C',
    source: 'Span et al. (2000), reference equation of nitrogen, at 1 atm',
    inputs: pure('nitrogen', 273.15),
    expected: 336.969,
    tolerance: 0.17,
    whyTolerance: 'nitrogen at 1 atm is within 0.05 % of an ideal gas',
    kind: 'independent',
  },
  {
    id: 'argon at 0 °C',
    source: 'Tegeler, Span and Wagner (1999), reference equation of argon, at 1 atm',
    inputs: pure('argon', 273.15),
    expected: 307.86,
    tolerance: 0.15,
    whyTolerance: 'argon at 1 atm is within 0.05 % of an ideal gas',
    kind: 'independent',
  },
  {
    id: 'helium at 20 °C',
    source: 'Reference equation of helium (Ortiz-Vega et al.), at 1 atm',
    inputs: pure('helium', 293.15),
    expected: 1007.9,
    tolerance: 0.6,
    whyTolerance: 'helium at 1 atm is within 0.06 % of an ideal gas',
    kind: 'independent',
  },
];

const MOLAR_HEATS: readonly Row<State>[] = [
  ['methane', 250, 34.26749, 5e-4],
  ['methane', 300, 35.77752, 5e-4],
  ['methane', 400, 40.60778, 5e-4],
  ['ethane', 300, 52.69762, 4e-4],
  ['propane', 300, 73.69807, 5e-4],
  ['n_butane', 400, 124.76963, 7e-4],
  ['n_heptane', 300, 165.98056, 1.2e-3],
  ['nitrogen', 300, 29.12615, 1e-4],
  ['carbon_dioxide', 300, 37.22551, 4e-4],
  ['hydrogen_sulfide', 300, 34.12969, 2e-4],
  ['hydrogen', 300, 28.84731, 1e-4],
  ['water', 400, 34.26213, 1e-4],
  ['oxygen', 300, 29.38501, 1e-4],
  ['r134a', 300, 85.36983, 1e-4],
].map(([id, temperature, expected, relative]) => ({
  id: `${id} at ${temperature} K`,
  source: 'ideal-gas part of the reference equation of the fluid, as carried by the open-source library CoolProp 8.0.0',
  inputs: pure(String(id), Number(temperature)),
  expected: Number(expected),
  tolerance: Number(relative) * Number(expected),
  whyTolerance: 'largest error of the fit that our coefficients are',
  kind: 'independent',
}));

const HANDBOOK_MOLAR_HEATS: readonly Row<State>[] = [
  ['methane', 35.69, 0.03],
  ['nitrogen', 29.124, 0.01],
  ['carbon_dioxide', 37.13, 0.03],
  ['oxygen', 29.378, 0.01],
  ['hydrogen', 28.836, 0.01],
  ['water', 33.588, 0.01],
  ['carbon_monoxide', 29.141, 0.01],
].map(([id, expected, tolerance]) => ({
  id: `${id} at 298.15 K`,
  source:
    'NIST Chemistry WebBook, gas-phase heat capacity at 298.15 K (methane: Gurvich et al.; others: NIST-JANAF Tables, 4th ed.); from memory',
  inputs: pure(String(id), 298.15),
  expected: Number(expected),
  tolerance: Number(tolerance),
  whyTolerance: 'error of the fit, up to 0.05 %, and the spread of published evaluations (methane: 35.64 to 35.70)',
  kind: 'published',
}));

function molarHeat({ gas, temperature }: State): number {
  const model = ideal(gas);
  return idealHeatCapacityCp(model, temperature) * molarMass(model);
}

describe('molar mass, kg/kmol', () => {
  it.each(byId(MOLAR_MASSES))('%s', (_, row) => expectRow(molarMass(ideal(row.inputs)) * 1000, row));
});

describe('density, kg/m³', () => {
  it.each(byId(DENSITIES))('%s', (_, row) => {
    const { gas, pressure, temperature } = row.inputs;
    expectRow(idealDensity(ideal(gas), pressure, temperature), row);
  });
});

describe('speed of sound, m/s', () => {
  it.each(byId(SOUND))('%s', (_, row) =>
    expectRow(idealSpeedOfSound(ideal(row.inputs.gas), row.inputs.temperature), row),
  );
});

describe('molar heat capacity at constant pressure, J/(mol K)', () => {
  it.each(byId([...MOLAR_HEATS, ...HANDBOOK_MOLAR_HEATS]))('%s', (_, row) => expectRow(molarHeat(row.inputs), row));
});

describe('heat capacity at constant volume, J/(kg K)', () => {
  it('argon, 3/2 R over its molar mass', () => {
    expectRow(idealHeatCapacityCv(ideal({ argon: 1 }), 300), {
      id: 'argon',
      source: 'kinetic theory of a monatomic gas: 1.5 times 8.31446261815324 over 0.039948',
      inputs: undefined,
      expected: 312.198,
      tolerance: 0.001,
      whyTolerance: 'printed digits',
      kind: 'hand',
    });
  });
});
