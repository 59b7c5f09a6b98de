import type { ReactNode } from 'react';
import type { RevisionDetail } from '../../../schemas/api.ts';
import { SectionTitle } from '../../ui/heading.tsx';
import { Time } from '../../ui/time.tsx';

/** What is recorded of a revision: who signed what, and every move with its reason. */
export function RecordPanel({ detail }: { readonly detail: RevisionDetail }) {
  const { signatures, events, summary, report } = detail;
  return (
    <div className="flex min-w-0 flex-col gap-10 wide:col-span-2">
      <section>
        <SectionTitle>Signatures</SectionTitle>
        {signatures.length === 0 ? (
          <p className="text-pencil">
            Nobody has signed yet. Author, checker and approver are three people, and each signs the same manifest.
          </p>
        ) : (
          <Rows>
            {signatures.map((signature) => (
              <Row key={signature.role} term={signature.role}>
                <span className="font-semibold">{signature.name}</span>{' '}
                <span className="text-pencil">{signature.email}</span>
                <span className="block">{signature.meaning}</span>
                <span className="block text-pencil">
                  <Time iso={signature.time} precise />, key{' '}
                  <code className="font-mono text-[0.8125rem] break-all">{signature.kid}</code>
                </span>
              </Row>
            ))}
          </Rows>
        )}
      </section>
      <section>
        <SectionTitle>History</SectionTitle>
        <Rows>
          {events.map((event, index) => (
            <Row key={index} term={event.event}>
              {event.person.name}, <Time iso={event.time} precise />
              {event.note !== '' && <span className="block text-pencil">{event.note}</span>}
            </Row>
          ))}
        </Rows>
      </section>
      <section>
        <SectionTitle>Digests</SectionTitle>
        <Rows>
          <Row term="manifest">
            <code className="font-mono text-[0.8125rem] break-all">{summary.manifest}</code>
          </Row>
          <Row term="sheet">
            <code className="font-mono text-[0.8125rem] break-all">{report.sheet.digest}</code>
          </Row>
          <Row term="core">{report.core}</Row>
        </Rows>
      </section>
    </div>
  );
}

function Rows({ children }: { readonly children: ReactNode }) {
  return <dl className="border-t border-rule">{children}</dl>;
}

function Row({ term, children }: { readonly term: string; readonly children: ReactNode }) {
  return (
    <div className="grid gap-x-6 border-b border-rule py-2 sm:grid-cols-[8rem_1fr]">
      <dt className="text-pencil">{term}</dt>
      <dd>{children}</dd>
    </div>
  );
}
