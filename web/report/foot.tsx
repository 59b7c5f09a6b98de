import type { LocatedDiagnostic, Report } from '../../core/report/model.ts';

/** After the last section: warnings, what the sheet refers to, and the cautions that every report carries. */
export function Foot({ report }: { readonly report: Report }) {
  return (
    <>
      {report.diagnostics.length > 0 && <Warnings diagnostics={report.diagnostics} />}
      {report.sources.length > 0 && (
        <section className="an-section" aria-labelledby="references">
          <h2 id="references">References</h2>
          <ul className="an-references">
            {report.sources.map(({ id, text }) => (
              <li key={id}>{text}</li>
            ))}
          </ul>
        </section>
      )}
      <footer className="an-cautions">
        {report.cautions.map((caution) => (
          <p key={caution}>{caution}</p>
        ))}
      </footer>
    </>
  );
}

function Warnings({ diagnostics }: { readonly diagnostics: readonly LocatedDiagnostic[] }) {
  return (
    <section className="an-section" aria-labelledby="warnings">
      <h2 id="warnings">Warnings</h2>
      <ul className="an-warnings">
        {diagnostics.map((diagnostic, index) => (
          <li key={index}>
            <span className="an-warning-word">{diagnostic.severity}</span> {diagnostic.message}{' '}
            <code>
              {diagnostic.file}:{diagnostic.line}:{diagnostic.column} {diagnostic.code}
            </code>
            {diagnostic.hints.map((hint) => (
              <span key={hint} className="an-note">
                {hint}
              </span>
            ))}
          </li>
        ))}
      </ul>
    </section>
  );
}
