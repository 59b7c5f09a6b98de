/** Round values between two ends, about as many as asked for: steps of 1, 2 or 5 times a power of ten. */
export function ticks(from: number, to: number, about: number): number[] {
  const span = to - from;
  if (!(span > 0) || !Number.isFinite(span)) return [from];
  const rough = span / Math.max(1, about);
  const magnitude = 10 ** Math.floor(Math.log10(rough));
  const step =
    [1, 2, 5, 10].map((factor) => factor * magnitude).find((candidate) => candidate >= rough) ?? 10 * magnitude;
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => (first + i) * step);
}

/** Both ends of the values, from zero where they begin near it, with the last tick above the greatest. */
export function extent(values: readonly number[]): readonly [number, number] {
  const [least, greatest] = [Math.min(...values), Math.max(...values)];
  const from = least >= 0 && least < 0.6 * greatest ? 0 : least;
  const to = greatest > from ? greatest : from + 1;
  return [from, to + (to - from) * 0.04];
}

/** A tick as it is written: no digits beyond those of the step. */
export function tickText(value: number): string {
  return String(Number(value.toPrecision(10))).replace('-', '\u2212');
}
