/** A value ready to be shown: the number at its printed digits, and its unit. */
export interface Printed {
  /** `22.05`, with a hyphen-minus; `1.05e-6` for very small or large numbers. */
  readonly number: string;
  readonly unit: string;
  /** Number and unit in TeX. */
  readonly tex: string;
}
