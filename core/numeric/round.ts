/**
 * A number at so many significant digits. A conversion there and back leaves `1000.0000000000001` of 1000: at 15 digits
 * that noise is gone, and nothing that means something is lost. The largest numbers of all stay as they are, as rounding
 * up would leave them nowhere to go.
 */
export function roundTo(value: number, digits: number): number {
  const rounded = Number(value.toPrecision(digits));
  return Number.isFinite(rounded) ? rounded : value;
}
