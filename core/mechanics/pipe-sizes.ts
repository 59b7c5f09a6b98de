import { PIPE_SIZES, type PipeSize } from './data/pipe-sizes.ts';

const INCH = 0.0254;
/** Sizes as numbers come out of sheets as decimals: 0.125 is exact, and this only forgives the last bits. */
const SIZE_TOLERANCE = 1e-9;

/** What a look-up found, in m, or why it found nothing. */
export type PipeLookup = { readonly value: number } | { readonly missing: MissingPipe };

export interface MissingPipe {
  readonly about: 'size' | 'schedule';
  readonly message: string;
  readonly hints: readonly string[];
}

type Found<T> = { readonly found: T } | { readonly missing: MissingPipe };

/**
 * Outside diameter of steel pipe.
 *
 * @formula D_o from the table
 * @param nps  NPS  nominal pipe size, as a number or as the trade writes it (`6`, `3/4`, `1-1/2`)  1/8 to 48
 * @returns outside diameter [m]; `missing` where the table has no such size
 * @validity wrought steel and stainless steel pipe; mill tolerances are not taken off
 * @source ASME B36.10M, ASME B36.19M, table of dimensions
 * @check NPS 6 -> 6.625 in
 */
export function pipeOutsideDiameter(nps: number | string): PipeLookup {
  const size = findSize(nps);
  return 'missing' in size ? size : { value: size.found.outsideDiameter * INCH };
}

/**
 * Nominal wall thickness of steel pipe.
 *
 * @formula t from the table
 * @param nps       NPS  nominal pipe size                                   1/8 to 48
 * @param schedule  S    schedule: `Sch 80`, `80`, `STD`, `XS`, `XXS`, `10S`
 * @returns wall thickness [m]; `missing` where the table has no such size or schedule
 * @validity as `pipeOutsideDiameter`
 * @source ASME B36.10M, ASME B36.19M, table of dimensions
 * @check NPS 6, Sch 80 -> 0.432 in
 */
export function pipeWall(nps: number | string, schedule: string): PipeLookup {
  const size = findSize(nps);
  if ('missing' in size) return size;
  const wall = findWall(size.found, schedule);
  return 'missing' in wall ? wall : { value: wall.found * INCH };
}

/**
 * Bore (inside diameter) of steel pipe with the nominal wall.
 *
 * @formula D_i = D_o - 2 t
 * @param nps       NPS  nominal pipe size                                   1/8 to 48
 * @param schedule  S    schedule: `Sch 80`, `80`, `STD`, `XS`, `XXS`, `10S`
 * @returns bore [m]; `missing` where the table has no such size or schedule
 * @validity as `pipeOutsideDiameter`
 * @source ASME B36.10M, ASME B36.19M, table of dimensions
 * @check NPS 6, Sch 80 -> 5.761 in
 */
export function pipeBore(nps: number | string, schedule: string): PipeLookup {
  const size = findSize(nps);
  if ('missing' in size) return size;
  const wall = findWall(size.found, schedule);
  return 'missing' in wall ? wall : { value: (size.found.outsideDiameter - 2 * wall.found) * INCH };
}

function findSize(nps: number | string): Found<PipeSize> {
  const size = typeof nps === 'number' ? nps : readSize(nps);
  if (size === undefined) {
    const message = `\`${nps}\` is not a nominal pipe size`;
    return {
      missing: { about: 'size', message, hints: ["write it as a number or as the trade does: 6, '3/4', '1-1/2'"] },
    };
  }
  const found = PIPE_SIZES.find((candidate) => Math.abs(candidate.size - size) < SIZE_TOLERANCE);
  if (found !== undefined) return { found };
  const near = neighbours(size);
  const nearest =
    near.length > 1 ? `the nearest sizes are NPS ${near.join(' and ')}` : `the nearest size is NPS ${near.join('')}`;
  return { missing: { about: 'size', message: `there is no pipe of NPS ${nps}`, hints: [nearest] } };
}

/** `3/4`, `1-1/2`, `1 1/2`, `6`, `0.75`, `NPS 6` as a number. */
function readSize(text: string): number | undefined {
  const match = /^(?:nps\s*)?(?:(\d+(?:\.\d+)?)|(?:(\d+)[-\s]+)?(\d+)\/(\d+))$/i.exec(text.trim());
  if (match === null) return undefined;
  const [, decimal, whole = '0', numerator, denominator] = match;
  if (decimal !== undefined) return Number(decimal);
  const size = Number(whole) + Number(numerator) / Number(denominator);
  return Number.isFinite(size) ? size : undefined;
}

/** The sizes of the table on both sides of one that it does not have; at its ends the last one alone. */
function neighbours(size: number): string[] {
  const below = PIPE_SIZES.filter((candidate) => candidate.size < size).at(-1);
  const above = PIPE_SIZES.find((candidate) => candidate.size > size);
  return [below, above].flatMap((candidate) => (candidate === undefined ? [] : [candidate.nps]));
}

function findWall(size: PipeSize, schedule: string): Found<number> {
  const wanted = schedule
    .trim()
    .toUpperCase()
    .replace(/^(?:SCHEDULE|SCH)\.?\s*/, '');
  const found = size.walls.get(wanted);
  if (found !== undefined) return { found };
  const message = `NPS ${size.nps} has no schedule \`${schedule}\``;
  const hints = [`the schedules of NPS ${size.nps} are ${[...size.walls.keys()].join(', ')}`];
  return { missing: { about: 'schedule', message, hints } };
}
