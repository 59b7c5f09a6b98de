import type { ComparisonOperator } from '../expression/tree.ts';

/** Equality within rounding: a demand that equals its limit to the last bits of double arithmetic is at the limit. */
const ROUNDING = 1e-12;

export interface Judgement {
  readonly passes: boolean;
  readonly utilisation: number | null;
}

/**
 * Holds a demand against its limit.
 *
 * For `demand <= limit` (and `<`) the utilisation is demand / limit; for `demand >= limit` (and `>`), where the limit is a
 * least value, it is limit / demand. So 1.00 is at the limit, above 1.00 is over it, whichever way the check points.
 * Without a meaningful ratio (a limit of zero, or sides of opposite sign) it is null, and only `passes` counts.
 *
 * @param operator of the comparison
 * @param left     demand, SI
 * @param right    limit, SI, same dimension
 */
export function judge(operator: ComparisonOperator, left: number, right: number): Judgement {
  const upper = operator === '<' || operator === '<=';
  const [demand, limit] = upper ? [left, right] : [right, left];
  return { passes: compare(operator, left, right), utilisation: ratio(demand, limit) };
}

function compare(operator: ComparisonOperator, left: number, right: number): boolean {
  const equal = Math.abs(left - right) <= ROUNDING * Math.max(Math.abs(left), Math.abs(right));
  switch (operator) {
    case '<':
      return left < right && !equal;
    case '<=':
      return left <= right || equal;
    case '>':
      return left > right && !equal;
    case '>=':
      return left >= right || equal;
  }
}

function ratio(demand: number, limit: number): number | null {
  const isMeaningful = (limit > 0 && demand >= 0) || (limit < 0 && demand < 0);
  // Both sides below zero: the larger magnitude is the stronger demand on a lower limit, so the ratio turns over.
  const utilisation = limit > 0 ? demand / limit : limit / demand;
  return isMeaningful && Number.isFinite(utilisation) ? utilisation : null;
}
