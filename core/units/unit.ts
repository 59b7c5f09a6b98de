import type { Amplitude, Dimension, Kind, QuantityType } from './dimension.ts';

export type UnitSystem = 'us' | 'si' | 'both';

/** One unit, or a product of unit powers such as `lbm/ft^3`. SI value = (number + offset of gauge) × factor + shift. */
export interface Unit {
  /** As a sheet writes it and as JSON shows it: `psig`, `kg/m^3`. */
  readonly text: string;
  /** As TeX sets it, upright. */
  readonly tex: string;
  readonly dimension: Dimension;
  readonly kind: Kind;
  /** Multiply by this to get SI. */
  readonly factor: number;
  /** Added after the factor: 273.15 for degC; 0 for units that start at zero. */
  readonly shift: number;
  /** A gauge pressure: the sheet's atmosphere is added as well. */
  readonly gauge: boolean;
  readonly system: UnitSystem;
  readonly amplitude?: Amplitude;
  /** A volume that stands for an amount: the sheet's reference state goes in, to this power. */
  readonly reference?: { readonly state: 'normal' | 'standard'; readonly power: number };
}

/** The type of what is written in a unit. */
export function typeOfUnit({ dimension, kind, amplitude }: Unit): QuantityType {
  return amplitude === undefined ? { dimension, kind } : { dimension, kind, amplitude };
}
