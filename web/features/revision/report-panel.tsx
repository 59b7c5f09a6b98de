import { useCallback, useMemo, useState } from 'react';
import type { Block } from '../../../core/report/model.ts';
import type { Person, RevisionDetail } from '../../../schemas/api.ts';
import { blockId } from '../../report/block-id.ts';
import { pageStyle } from '../../report/page-style.ts';
import { ReportView } from '../../report/report-view.tsx';
import { formatDay, formatTime } from '../../lib/dates.ts';
import { useMedia } from '../../lib/use-media.ts';
import { Contents } from './contents.tsx';
import { Key, KeysDialog } from './keys-dialog.tsx';
import { MarginSheet } from './margin-sheet.tsx';
import { Margin } from './margin.tsx';
import { MarkButton } from './mark-button.tsx';
import { noteGroups } from './notes.ts';
import { useRemarkActions } from './remark-actions.ts';
import type { RevisionRef } from './revision-ref.ts';
import { useKeyboard, type KeyCommand } from './use-keyboard.ts';
import { useReview, type Review } from './use-review.ts';

/** From here on there is room for three columns. Repeated as the breakpoint `wide` in app.css. */
const WIDE = '(min-width: 74rem)';

interface ReportPanelProps {
  readonly reference: RevisionRef;
  readonly detail: RevisionDetail;
  readonly me: Person;
  readonly studyTitle: string;
}

/** Contents, report and margin, and the keys that walk them. */
export function ReportPanel({ reference, detail, me, studyTitle }: ReportPanelProps) {
  const { report, may } = detail;
  const review = useReview(reference, detail, me);
  const actions = useRemarkActions(reference, me, may);
  const isWide = useMedia(WIDE);
  const [open, setOpen] = useState<'keys' | 'sheet' | null>(null);
  const groups = noteGroups(review.blocks, detail.remarks, review.composing);
  const current = review.current === undefined ? undefined : review.blocks.get(review.current);

  const startRemark = (path: string) => {
    if (!may.remark) return;
    review.compose(path);
    if (!isWide) setOpen('sheet');
  };
  useKeyboard(useCommands({ review, may, current, startRemark, openKeys: () => setOpen('keys') }));

  const { markOf, toggleMark } = review;
  const renderAside = useCallback(
    (block: Block) => (
      <MarkButton block={block} mark={markOf.get(block.path)} mayMark={may.mark} onToggle={toggleMark} />
    ),
    [markOf, may.mark, toggleMark],
  );
  const identity = useMemo(() => identityOf(detail, studyTitle), [detail, studyTitle]);
  const notes = { reference, groups, actions, onCloseComposer: review.closeComposer, onSelect: review.goTo };

  return (
    <>
      <style media="print">{pageStyle(report, reference.revision)}</style>
      <div className="contents-column">
        {isWide ? (
          <>
            <Contents report={report} />
            <p className="mt-6 border-t border-rule pt-4 text-[0.8125rem] leading-7 text-pencil">
              <Key name="j" /> <Key name="k" /> walk, <Key name="m" /> mark, <Key name="r" /> remark,{' '}
              <button type="button" className="cursor-pointer hover:text-ink" onClick={() => setOpen('keys')}>
                <Key name="?" /> all keys
              </button>
            </p>
          </>
        ) : (
          <FoldedContents report={report} />
        )}
      </div>
      <div className="report-column">
        <ReportView
          report={report}
          identity={identity}
          renderAside={renderAside}
          current={review.current}
          onSelect={review.select}
        />
      </div>
      {isWide ? (
        <Margin {...notes} current={review.current} onSelect={review.select} />
      ) : (
        <MarginSheet
          {...notes}
          current={current}
          isMarked={current !== undefined && markOf.has(current.path)}
          isOpen={open === 'sheet'}
          onOpen={(isOpen) => setOpen(isOpen ? 'sheet' : null)}
          onMark={() => current !== undefined && toggleMark(current)}
          onRemark={() => current !== undefined && startRemark(current.path)}
        />
      )}
      {open === 'keys' && <KeysDialog onClose={() => setOpen(null)} />}
    </>
  );
}

function FoldedContents({ report }: Pick<RevisionDetail, 'report'>) {
  return (
    <details className="mb-4 border border-rule bg-sheet px-4 py-2 print:hidden">
      <summary className="cursor-pointer font-semibold">Contents</summary>
      <div className="mt-3">
        <Contents report={report} />
      </div>
    </details>
  );
}

interface CommandParts {
  readonly review: Review;
  readonly may: RevisionDetail['may'];
  readonly current: Block | undefined;
  readonly startRemark: (path: string) => void;
  readonly openKeys: () => void;
}

function useCommands({ review, may, current, startRemark, openKeys }: CommandParts): (command: KeyCommand) => void {
  return (command) => {
    switch (command) {
      case 'next':
        return review.step(1);
      case 'previous':
        return review.step(-1);
      case 'mark':
        if (current !== undefined && may.mark) review.toggleMark(current);
        return;
      case 'remark':
        if (current !== undefined) startRemark(current.path);
        return;
      case 'trace':
        if (current !== undefined) toggleTrace(current.path);
        return;
      case 'keys':
        return openKeys();
      case 'close':
        for (const path of review.composing) review.closeComposer(path);
        return;
    }
  };
}

function toggleTrace(path: string): void {
  const trace = document.getElementById(blockId(path))?.querySelector<HTMLDetailsElement>('details.an-trace');
  if (trace) trace.open = !trace.open;
}

function identityOf({ summary, signatures }: RevisionDetail, study: string) {
  return {
    study,
    revision: summary.revision,
    pushed: formatDay(summary.pushed),
    signatures: signatures.map(({ role, name, time }) => ({ role, name, time: formatTime(time) })),
  };
}
