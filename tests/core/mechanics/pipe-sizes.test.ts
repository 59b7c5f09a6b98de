import { describe, expect, it } from 'vitest';
import { PIPE_SIZES } from '../../../core/mechanics/data/pipe-sizes.ts';
import { pipeBore, pipeOutsideDiameter, pipeWall, type PipeLookup } from '../../../core/mechanics/pipe-sizes.ts';

const INCH = 0.0254;

function inches(lookup: PipeLookup): number {
  if ('missing' in lookup) throw new Error(lookup.missing.message);
  return lookup.value / INCH;
}

function missing(lookup: PipeLookup): { about: string; message: string; hints: readonly string[] } {
  if (!('missing' in lookup)) throw new Error('found');
  return lookup.missing;
}

/** Schedules of which each is as thick as the one before it or thicker, wherever a size has both. */
const RISING = [
  ['5', '10', '20', '30', '40', '60', '80', '100', '120', '140', '160'],
  ['STD', 'XS', 'XXS'],
  ['5S', '10S', '40S', '80S'],
];

describe('the table of pipe sizes', () => {
  it('goes from NPS 1/8 to 48 in rising sizes', () => {
    expect(PIPE_SIZES.map(({ nps }) => nps)).toEqual(
      '1/8 1/4 3/8 1/2 3/4 1 1-1/4 1-1/2 2 2-1/2 3 3-1/2 4 5 6 8 10 12 14 16 18 20 22 24 26 28 30 32 34 36 38 40 42 44 46 48'.split(
        ' ',
      ),
    );
    for (const [i, { size, outsideDiameter }] of PIPE_SIZES.entries()) {
      const next = PIPE_SIZES[i + 1];
      if (next !== undefined) expect([next.size > size, next.outsideDiameter > outsideDiameter]).toEqual([true, true]);
    }
  });

  it('has an outside diameter equal to the nominal size from NPS 14 up, and above it below', () => {
    for (const { size, outsideDiameter } of PIPE_SIZES) {
      if (size >= 14) expect(outsideDiameter).toBe(size);
      else expect(outsideDiameter).toBeGreaterThan(size);
    }
  });

  it.each(PIPE_SIZES.map((pipe) => [pipe.nps, pipe] as const))(
    'NPS %s follows the laws of the standards',
    (_, pipe) => {
      for (const wall of pipe.walls.values()) expect(pipe.outsideDiameter - 2 * wall).toBeGreaterThan(0);
      for (const schedules of RISING) {
        const walls = schedules.flatMap((schedule) => pipe.walls.get(schedule) ?? []);
        expect(walls).toEqual(walls.toSorted((a, b) => a - b));
        if (!schedules.includes('STD')) expect(new Set(walls).size).toBe(walls.length);
      }
      const { size, walls } = pipe;
      if (size <= 10) expect(walls.get('STD')).toBe(walls.get('40'));
      if (size >= 12) expect(walls.get('STD')).toBe(0.375);
      if (size <= 8) expect(walls.get('XS')).toBe(walls.get('80'));
      if (size >= 8) expect(walls.get('XS')).toBe(0.5);
      if (size <= 12) expect([walls.get('40S'), walls.get('80S')]).toEqual([walls.get('STD'), walls.get('XS')]);
    },
  );
});

describe('pipe look-ups', () => {
  it('take sizes as numbers and as the trade writes them', () => {
    for (const nps of [1.5, '1.5', '1-1/2', '1 1/2', 'NPS 1-1/2'])
      expect(inches(pipeOutsideDiameter(nps))).toBeCloseTo(1.9, 12);
    for (const nps of [0.75, '3/4', ' 3/4 ']) expect(inches(pipeOutsideDiameter(nps))).toBeCloseTo(1.05, 12);
  });

  it('take schedules in any usual spelling', () => {
    for (const schedule of ['Sch 80', '80', 'sch80', 'SCH. 80', 'Schedule 80', 'XS', 'xs', '80S'])
      expect(inches(pipeWall(6, schedule))).toBeCloseTo(0.432, 12);
    expect(inches(pipeWall(6, 'Sch 10S'))).toBeCloseTo(0.134, 12);
    expect(inches(pipeWall(12, 'STD'))).toBeCloseTo(0.375, 12);
    expect(inches(pipeWall(12, 'Sch 40'))).toBeCloseTo(0.406, 12);
  });

  it('give the bore as the outside diameter less two walls', () => {
    for (const { nps, outsideDiameter, walls } of PIPE_SIZES)
      for (const [schedule, wall] of walls)
        expect(inches(pipeBore(nps, schedule))).toBeCloseTo(outsideDiameter - 2 * wall, 10);
  });

  it('say what is wrong with a size', () => {
    expect(missing(pipeBore(9, 'STD'))).toEqual({
      about: 'size',
      message: 'there is no pipe of NPS 9',
      hints: ['the nearest sizes are NPS 8 and 10'],
    });
    expect(missing(pipeOutsideDiameter(150)).hints).toEqual(['the nearest size is NPS 48']);
    expect(missing(pipeOutsideDiameter('six')).message).toBe('`six` is not a nominal pipe size');
    expect(missing(pipeOutsideDiameter('1/0'))).toMatchObject({
      about: 'size',
      message: '`1/0` is not a nominal pipe size',
    });
  });

  it('name the schedules of a size that lacks the one asked for', () => {
    expect(missing(pipeWall('3-1/2', 'Sch 160'))).toMatchObject({
      about: 'schedule',
      message: 'NPS 3-1/2 has no schedule `Sch 160`',
      hints: ['the schedules of NPS 3-1/2 are 5, 10, 30, 40, STD, 80, XS, 5S, 10S, 40S, 80S'],
    });
  });
});
