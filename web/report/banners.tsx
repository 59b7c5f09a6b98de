import type { CheckResult, Hold, Report } from '../../core/report/model.ts';
import { blockId } from './block-id.ts';
import { HOLD, STANDINGS } from './standing.tsx';
import { formatUtilisation } from './utilisation.tsx';

/** What a reader must know before the first number: open holds, then failed checks. */
export function Banners({ report }: { readonly report: Report }) {
  return (
    <>
      {report.holds.length > 0 && <HoldsBanner holds={report.holds} />}
      <FailedBanner checks={report.checks.filter((check) => check.status === 'fail')} />
    </>
  );
}

function HoldsBanner({ holds }: { readonly holds: readonly Hold[] }) {
  return (
    <aside className="an-banner an-banner-hold" aria-label="Open holds">
      <div className="an-banner-word">
        <span aria-hidden="true">{HOLD.glyph}</span> {holds.length === 1 ? 'Hold' : `${holds.length} holds`}
      </div>
      <div>
        <ul>
          {holds.map((hold) => (
            <li key={hold.path}>
              <a href={`#${blockId(hold.path)}`}>{hold.label}</a>: {hold.reason}
            </li>
          ))}
        </ul>
        <p>This sheet can’t be approved while {holds.length === 1 ? 'it is' : 'they are'} open.</p>
      </div>
    </aside>
  );
}

function FailedBanner({ checks }: { readonly checks: readonly CheckResult[] }) {
  if (checks.length === 0) return null;
  return (
    <aside className="an-banner an-banner-failed" aria-label="Failed checks">
      <div className="an-banner-word">
        <span aria-hidden="true">{STANDINGS.over.glyph}</span> {checks.length === 1 ? 'Over' : `${checks.length} over`}
      </div>
      <ul>
        {checks.map((check) => (
          <li key={check.path}>
            <a href={`#${blockId(check.path)}`}>{check.label}</a>: utilisation {formatUtilisation(check.utilisation)}
          </li>
        ))}
      </ul>
    </aside>
  );
}
