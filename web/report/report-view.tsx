import { useMemo, type ReactNode, type SyntheticEvent } from 'react';
import type { Block, Report } from '../../core/report/model.ts';
import { Banners } from './banners.tsx';
import { Foot } from './foot.tsx';
import { SectionView } from './section-view.tsx';
import type { SharedParts } from './shared.ts';
import { TitleBlock, type Identity } from './title-block.tsx';

interface ReportViewProps {
  readonly report: Report;
  /** Study, revision and signatures, where the report comes from a server or a bundle. */
  readonly identity?: Identity;
  /** What stands in the gutter beside a block. Keep the function the same between renders where it draws the same. */
  readonly renderAside?: (block: Block) => ReactNode;
  /** Path of the block that the reader is at. */
  readonly current?: string | undefined;
  readonly onSelect?: (path: string) => void;
}

/** The report: the one view of it that web viewer, offline file and print share. */
export function ReportView({ report, identity, renderAside, current, onSelect }: ReportViewProps) {
  const blocks = useMemo(() => blocksByPath(report), [report]);
  const shared = useMemo<SharedParts>(
    () => ({ blocks, axes: report.axes, quantities: report.quantities, renderAside }),
    [blocks, report, renderAside],
  );
  const select = (event: SyntheticEvent) => {
    const path = pathAt(event.target);
    if (path !== null && path !== current) onSelect?.(path);
  };
  return (
    <article
      className="an-report"
      onClick={select}
      onFocus={select}
      aria-label={`${report.sheet.number} ${report.sheet.title}`}
    >
      <TitleBlock report={report} identity={identity} />
      <Banners report={report} />
      {report.sections.map((section) => (
        <SectionView key={section.path} section={section} current={current} shared={shared} />
      ))}
      <Foot report={report} />
    </article>
  );
}

export function blocksByPath(report: Report): ReadonlyMap<string, Block> {
  return new Map(report.sections.flatMap((section) => section.blocks).map((block) => [block.path, block]));
}

function pathAt(target: EventTarget): string | null {
  return target instanceof Element ? (target.closest('[data-path]')?.getAttribute('data-path') ?? null) : null;
}
