import type { Unit } from './unit.ts';

/** The pressure and temperature at which a volume of gas stands for an amount of it. */
export interface ReferenceState {
  /** Absolute, Pa. */
  readonly pressure: number;
  /** K. */
  readonly temperature: number;
}

/** What a sheet states once and several units rest on: without it, those units have no meaning. */
export interface Site {
  /** Absolute, Pa: turns gauge readings into absolute pressures. */
  readonly atmosphere?: number;
  /** Behind `Nm3`. */
  readonly normal?: ReferenceState;
  /** Behind `Sm3` and `SCF`. */
  readonly standard?: ReferenceState;
}

/** What a unit rests on that a site does not state; null where nothing is missing. */
export function missingFromSite({ gauge, reference }: Unit, site: Site): keyof Site | null {
  if (gauge && site.atmosphere === undefined) return 'atmosphere';
  return reference !== undefined && site[reference.state] === undefined ? reference.state : null;
}

export const NO_SITE: Site = {};
