/** A share as a change in percent, at three digits: `+1.63 %`; large ratios as a factor: `× 12.5`. */
export function percentText(share: number): string {
  if (share >= LARGE) return `× ${Number((1 + share).toPrecision(3))}`;
  const percent = Number((share * 100).toPrecision(3));
  return `${percent > 0 ? '+' : ''}${percent} %`;
}

/** From a tenfold value on, a percentage says less than a factor. */
const LARGE = 9;
