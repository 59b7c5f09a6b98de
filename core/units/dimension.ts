/** Exponents of length, mass, time, temperature and amount of substance, in this order. */
export type Dimension = readonly [length: number, mass: number, time: number, temperature: number, amount: number];

/**
 * What a number of a dimension stands for. Dimension and kind together are the type of a quantity.
 *
 * - `plain`      any quantity without a trap of its own
 * - `level`      a point on the pressure or temperature scale (absolute, in Pa or K)
 * - `difference` a distance between two points on one of those scales
 * - `open`       written in K or degR: a level where a level is wanted, else a difference
 * - `percent`    a share written in percent; times a level it gives a difference
 * - `cycles`     counts turns: Hz, rpm (1/s), or a number of turns (dimensionless)
 * - `radians`    counts radians: rad/s (1/s), or an angle (dimensionless)
 * - `root`       1/s out of a square root: radians by physics, but nobody has said so; must not be shown in Hz
 */
export type Kind = 'plain' | 'level' | 'difference' | 'open' | 'percent' | 'cycles' | 'radians' | 'root';

/** Which measure of an oscillation a number is; nobody can tell from the number. */
export type Amplitude = 'peak' | 'peak to peak' | 'rms';

export interface QuantityType {
  readonly dimension: Dimension;
  readonly kind: Kind;
  /** Not there for what does not oscillate, or does not say. */
  readonly amplitude?: Amplitude;
}
