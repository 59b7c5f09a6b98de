import { standingOf, type Standing } from './standing.tsx';

/** The bar ends a little beyond the limit, so that the mark at 1.00 stands inside it. */
const FULL_SCALE = 1.2;

export function formatUtilisation(utilisation: number | null): string {
  if (utilisation === null) return '–';
  return utilisation >= 100 ? 'over 100' : utilisation.toFixed(2);
}

/** Demand over limit as a bar with a tick at 1.00. Decorative: the number beside it says the same. */
export function UtilisationBar({
  utilisation,
  standing,
}: {
  readonly utilisation: number | null;
  readonly standing?: Standing;
}) {
  const share = Math.min(1, Math.max(0, (utilisation ?? 0) / FULL_SCALE));
  const shown = standing ?? standingOf(utilisation ?? 0);
  return (
    <span className="an-bar" aria-hidden="true">
      {utilisation !== null && (
        <span className={`an-bar-fill an-${shown}`} style={{ width: `${(share * 100).toFixed(1)}%` }} />
      )}
      <span className="an-bar-tick" style={{ left: `${(100 / FULL_SCALE).toFixed(1)}%` }} />
    </span>
  );
}
