import { useMemo } from 'react';
import type { Report } from '../../../core/report/model.ts';
import { blockId } from '../../report/block-id.ts';
import { sectionNumber } from '../../report/section-view.tsx';
import { STANDINGS, standingOf } from '../../report/standing.tsx';
import { formatUtilisation, UtilisationBar } from '../../report/utilisation.tsx';
import { useActiveSection } from './use-active-section.ts';

/** The contents, each with its worst utilisation as a thin bar; the section being read stands out. */
export function Contents({ report, onFollow }: { readonly report: Report; readonly onFollow?: () => void }) {
  const paths = useMemo(() => report.sections.map((section) => section.path), [report]);
  const active = useActiveSection(paths);
  return (
    <nav aria-label="Contents">
      <ol>
        {report.sections.map(({ path, title, utilisation }) => (
          <li key={path} className="mb-3">
            <a
              href={`#${blockId(path)}`}
              onClick={onFollow}
              aria-current={path === active ? 'true' : undefined}
              className={`flex gap-2 pb-1 hover:text-copper ${path === active ? 'font-semibold text-copper' : ''}`}
            >
              {sectionNumber(path) !== null && <span>{sectionNumber(path)}</span>}
              <span className="grow">{title}</span>
              {utilisation !== null && (
                <span className="font-normal text-pencil" title={STANDINGS[standingOf(utilisation)].word}>
                  {formatUtilisation(utilisation)}
                </span>
              )}
            </a>
            <span className="contents-bar">
              <UtilisationBar utilisation={utilisation} />
            </span>
          </li>
        ))}
      </ol>
    </nav>
  );
}
