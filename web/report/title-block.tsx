import type { Report } from '../../core/report/model.ts';

/** What a report does not know of itself: whose it is, and who has signed. Printed with it when it comes from a server. */
export interface Identity {
  readonly study: string;
  readonly revision: string;
  readonly pushed: string;
  readonly signatures: readonly { readonly role: string; readonly name: string; readonly time: string }[];
}

export function TitleBlock({
  report,
  identity,
}: {
  readonly report: Report;
  readonly identity?: Identity | undefined;
}) {
  const { sheet, summary } = report;
  return (
    <header className="an-title">
      <div className="an-title-words">
        <h1>{sheet.title}</h1>
        <p>{identity === undefined ? summaryText(summary) : identity.study}</p>
      </div>
      <dl className="an-title-facts">
        <TitleFact term="Number" value={sheet.number} />
        {identity !== undefined && <TitleFact term="Revision" value={`revision ${identity.revision}`} />}
        {identity !== undefined && <TitleFact term="Pushed" value={`pushed ${identity.pushed}`} />}
        {identity === undefined && <TitleFact term="Core" value={`core ${report.core}`} />}
      </dl>
      {identity !== undefined && identity.signatures.length > 0 && <Signatures signatures={identity.signatures} />}
    </header>
  );
}

function TitleFact({ term, value }: { readonly term: string; readonly value: string }) {
  return (
    <div>
      <dt className="an-hidden">{term}</dt>
      <dd>{value}</dd>
    </div>
  );
}

function Signatures({ signatures }: Pick<Identity, 'signatures'>) {
  return (
    <ul className="an-signatures" aria-label="Signatures">
      {signatures.map(({ role, name, time }) => (
        <li key={role}>
          <span className="an-label">{role}</span> {name} <span className="an-label">{time}</span>
        </li>
      ))}
    </ul>
  );
}

function summaryText({ passed, failed, holds }: Report['summary']): string {
  const checks = passed + failed;
  return [
    checks === 0 ? 'no checks' : `${passed} of ${checks} checks ${checks === 1 ? 'passes' : 'pass'}`,
    holds === 0 ? 'no holds' : `${holds} ${holds === 1 ? 'hold' : 'holds'} open`,
  ].join(', ');
}
