import { describe, it } from 'vitest';
import { pipeBore, pipeOutsideDiameter, pipeWall, type PipeLookup } from '../../core/mechanics/pipe-sizes.ts';
import { byId, expectRow, type Row } from './row.ts';

const INCH = 0.0254;

function metres(lookup: PipeLookup): number {
  if ('missing' in lookup) throw new Error(lookup.missing.message);
  return lookup.value;
}

interface Pipe {
  readonly nps: number | string;
  readonly schedule: string;
}

/** Plain-end weight of steel pipe, lb/ft, by the formula of the standard: 10.69 (D - t) t with D and t in inches. */
function plainEndWeight({ nps, schedule }: Pipe): number {
  const outside = metres(pipeOutsideDiameter(nps)) / INCH;
  const wall = metres(pipeWall(nps, schedule)) / INCH;
  return 10.69 * (outside - wall) * wall;
}

function weight(nps: number | string, schedule: string, expected: number): Row<Pipe> {
  return {
    id: `NPS ${nps} ${schedule}`,
    source: 'ASME B36.10M, table of dimensions, plain-end weight, lb/ft (from memory)',
    inputs: { nps, schedule },
    expected,
    tolerance: Math.max(0.011, expected * 4e-4),
    whyTolerance: 'printed to 0.01 lb/ft, and remembered from two editions whose factors differ in the fourth digit',
    kind: 'published',
  };
}

const WEIGHTS: readonly Row<Pipe>[] = [
  weight('1/8', 'Sch 40', 0.24),
  weight('1/4', 'Sch 40', 0.43),
  weight('3/8', 'Sch 40', 0.57),
  weight('1/2', 'Sch 40', 0.85),
  weight('1/2', 'Sch 80', 1.09),
  weight('1/2', 'Sch 160', 1.31),
  weight('1/2', 'XXS', 1.72),
  weight('3/4', 'Sch 40', 1.13),
  weight('3/4', 'Sch 80', 1.48),
  weight('3/4', 'XXS', 2.44),
  weight(1, 'Sch 40', 1.68),
  weight(1, 'Sch 80', 2.17),
  weight(1, 'Sch 160', 2.85),
  weight(1, 'XXS', 3.66),
  weight('1-1/4', 'Sch 40', 2.27),
  weight('1-1/4', 'XXS', 5.22),
  weight('1-1/2', 'Sch 40', 2.72),
  weight('1-1/2', 'Sch 80', 3.63),
  weight('1-1/2', 'Sch 160', 4.86),
  weight('1-1/2', 'XXS', 6.41),
  weight(2, 'Sch 40', 3.66),
  weight(2, 'Sch 80', 5.03),
  weight(2, 'Sch 160', 7.47),
  weight(2, 'XXS', 9.04),
  weight('2-1/2', 'Sch 40', 5.8),
  weight('2-1/2', 'Sch 80', 7.67),
  weight('2-1/2', 'XXS', 13.71),
  weight(3, 'Sch 40', 7.58),
  weight(3, 'Sch 80', 10.26),
  weight(3, 'Sch 160', 14.34),
  weight(3, 'XXS', 18.6),
  weight('3-1/2', 'Sch 40', 9.12),
  weight('3-1/2', 'Sch 80', 12.52),
  weight(4, 'Sch 40', 10.8),
  weight(4, 'Sch 80', 15),
  weight(4, 'Sch 120', 19.02),
  weight(4, 'Sch 160', 22.53),
  weight(4, 'XXS', 27.57),
  weight(5, 'Sch 40', 14.63),
  weight(5, 'Sch 80', 20.8),
  weight(5, 'XXS', 38.59),
  weight(6, 'Sch 40', 18.99),
  weight(6, 'Sch 80', 28.6),
  weight(6, 'Sch 120', 36.43),
  weight(6, 'Sch 160', 45.39),
  weight(6, 'XXS', 53.21),
  weight(8, 'Sch 20', 22.38),
  weight(8, 'Sch 30', 24.72),
  weight(8, 'Sch 40', 28.58),
  weight(8, 'Sch 60', 35.67),
  weight(8, 'Sch 80', 43.43),
  weight(8, 'Sch 100', 51),
  weight(8, 'Sch 120', 60.77),
  weight(8, 'Sch 140', 67.82),
  weight(8, 'XXS', 72.49),
  weight(8, 'Sch 160', 74.76),
  weight(10, 'Sch 20', 28.06),
  weight(10, 'Sch 30', 34.27),
  weight(10, 'Sch 40', 40.52),
  weight(10, 'XS', 54.79),
  weight(10, 'Sch 80', 64.49),
  weight(10, 'Sch 160', 115.75),
  weight(12, 'Sch 20', 33.41),
  weight(12, 'STD', 49.61),
  weight(12, 'Sch 40', 53.57),
  weight(12, 'XS', 65.48),
  weight(12, 'Sch 80', 88.71),
  weight(12, 'XXS', 125.61),
  weight(12, 'Sch 160', 160.42),
  weight(14, 'Sch 10', 36.75),
  weight(14, 'STD', 54.62),
  weight(14, 'Sch 40', 63.5),
  weight(14, 'XS', 72.16),
  weight(14, 'Sch 80', 106.23),
  weight(16, 'STD', 62.64),
  weight(16, 'Sch 40', 82.85),
  weight(16, 'Sch 80', 136.74),
  weight(18, 'STD', 70.65),
  weight(18, 'XS', 93.54),
  weight(18, 'Sch 40', 104.76),
  weight(20, 'STD', 78.67),
  weight(20, 'XS', 104.23),
  weight(20, 'Sch 40', 123.23),
  weight(20, 'Sch 80', 209.06),
  weight(24, 'STD', 94.71),
  weight(24, 'XS', 125.61),
  weight(24, 'Sch 40', 171.45),
  weight(24, 'Sch 80', 296.86),
  weight(24, 'Sch 160', 542.64),
  weight(30, 'STD', 118.76),
  weight(30, 'XS', 157.68),
  weight(36, 'STD', 142.81),
  weight(36, 'XS', 189.75),
];

function metric(nps: number | string, schedule: string, expected: number): Row<Pipe> {
  return {
    id: `NPS ${nps} ${schedule}, mm`,
    source:
      'ISO 4200 / metric column of ASME B36.10M and B36.19M, wall thickness, mm (from memory, and as the open-source library fluids carries it)',
    inputs: { nps, schedule },
    expected,
    tolerance: 0.0065,
    whyTolerance:
      'the metric column is the inch column rounded to 0.01 mm, some rows after the inch value was itself rounded to 0.001 in',
    kind: 'published',
  };
}

const METRIC_WALLS: readonly Row<Pipe>[] = [
  metric('1/2', 'Sch 40', 2.77),
  metric('3/4', 'Sch 80', 3.91),
  metric(1, '5S', 1.65),
  metric(2, 'Sch 40', 3.91),
  metric(2, '10S', 2.77),
  metric(3, 'Sch 80', 7.62),
  metric(4, 'Sch 40', 6.02),
  metric(6, 'Sch 40', 7.11),
  metric(6, 'Sch 80', 10.97),
  metric(6, '10S', 3.4),
  metric(8, 'Sch 40', 8.18),
  metric(8, '10S', 3.76),
  metric(10, 'Sch 40', 9.27),
  metric(10, 'Sch 80', 15.09),
  metric(12, '10S', 4.57),
  metric(14, '5S', 3.96),
  metric(20, '10S', 5.54),
  metric(24, '5S', 5.54),
  metric(30, '10S', 7.92),
  metric(32, 'Sch 40', 17.48),
  metric(36, 'Sch 40', 19.05),
];

const BORES: readonly Row<Pipe>[] = (
  [
    [6, 'Sch 80', 5.761],
    [6, 'Sch 40', 6.065],
    [2, 'Sch 40', 2.067],
    [3, 'Sch 40', 3.068],
    [4, 'Sch 40', 4.026],
    [8, 'Sch 40', 7.981],
    [8, 'Sch 80', 7.625],
    [10, 'Sch 40', 10.02],
    [12, 'STD', 12],
    [12, 'Sch 40', 11.938],
    [16, 'Sch 40', 15],
    [24, 'STD', 23.25],
  ] as const
).map(([nps, schedule, expected]) => ({
  id: `bore of NPS ${nps} ${schedule}, in`,
  source: 'Crane, Flow of Fluids, Technical Paper 410, appendix B, commercial steel pipe (from memory)',
  inputs: { nps, schedule },
  expected,
  tolerance: 0.0005,
  whyTolerance: 'printed to 0.001 in',
  kind: 'published',
}));

/** Earlier editions printed weights for a steel that is 0.1 % lighter: a factor of 10.68. */
const EARLIER_WEIGHTS: readonly Row<Pipe>[] = [weight(6, 'Sch 80', 28.57), weight(10, 'Sch 40', 40.48)].map((row) => ({
  ...row,
  id: `${row.id}, earlier edition`,
  tolerance: row.expected * 1.2e-3,
  whyTolerance: 'the factor of the earlier editions is 10.68, 0.1 % less than 10.69',
}));

describe('plain-end weights', () => {
  it.each(byId([...WEIGHTS, ...EARLIER_WEIGHTS]))('%s', (_, row) => expectRow(plainEndWeight(row.inputs), row));
});

describe('metric wall thickness', () => {
  it.each(byId(METRIC_WALLS))('%s', (_, row) =>
    expectRow(metres(pipeWall(row.inputs.nps, row.inputs.schedule)) * 1000, row),
  );
});

describe('bores', () => {
  it.each(byId(BORES))('%s', (_, row) => expectRow(metres(pipeBore(row.inputs.nps, row.inputs.schedule)) / INCH, row));
});
