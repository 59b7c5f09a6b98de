import { useState } from 'react';
import type { Move, RevisionDetail } from '../../../schemas/api.ts';
import { blockId } from '../../report/block-id.ts';
import { HOLD, standingOf } from '../../report/standing.tsx';
import { formatUtilisation } from '../../report/utilisation.tsx';
import { count } from '../../lib/words.ts';
import { Button } from '../../ui/button.tsx';
import { Bone } from '../../ui/skeleton.tsx';
import { StateCurve } from '../../ui/state-curve.tsx';
import { MoveDialog } from './move-dialog.tsx';
import { MOVES } from './moves.ts';
import type { RevisionRef } from './revision-ref.ts';

interface StripParts {
  readonly reference: RevisionRef;
  readonly detail: RevisionDetail;
}

interface StripProps extends StripParts {
  /** Whether the title is the page's heading; with the report on the page, the report's own is. */
  readonly isHeading: boolean;
}

const FRAME =
  'flex flex-wrap items-center gap-x-10 gap-y-3 border-b border-rule bg-paper px-4 py-3 sm:px-7 print:hidden wide:sticky wide:top-0 wide:z-30 wide:flex-nowrap';

/** The strip on top: how far the revision is, what governs it, and what I can do now. */
export function Strip({ reference, detail, isHeading }: StripProps) {
  const Title = isHeading ? 'h1' : 'p';
  return (
    <section aria-label="State of the revision" className={FRAME}>
      <StateCurve state={detail.summary.state} />
      <div className="min-w-0 grow basis-80">
        <Title className="font-serif text-[1.125rem] leading-snug font-semibold">{detail.summary.title}</Title>
        <Facts detail={detail} />
      </div>
      <Moves reference={reference} detail={detail} />
    </section>
  );
}

export function StripSkeleton() {
  return (
    <div className={FRAME}>
      <Bone className="h-14 w-[13.75rem]" />
      <div className="grow">
        <Bone className="h-5 w-96 max-w-full" />
        <Bone className="mt-2 h-4 w-72 max-w-full" />
      </div>
    </div>
  );
}

function Facts({ detail: { summary } }: Pick<StripParts, 'detail'>) {
  const { holds, remarks, marks } = summary;
  return (
    <p className="mt-0.5 flex flex-wrap gap-x-6 gap-y-0.5">
      <Governing summary={summary} />
      {holds > 0 && (
        <span className="font-semibold text-ochre-ink">
          <span aria-hidden="true">{HOLD.glyph}</span> {count(holds, 'hold')}
        </span>
      )}
      {remarks.mustFix > 0 && (
        <span>
          <span className="font-semibold text-madder">◆ {remarks.mustFix} must-fix</span>{' '}
          {remarks.mustFix === 1 ? 'remark' : 'remarks'}
        </span>
      )}
      {remarks.open > remarks.mustFix && <span>{count(remarks.open - remarks.mustFix, 'other remark')} open</span>}
      <span className="text-pencil">
        {marks.marked} of {count(marks.blocks, 'block')} marked{marks.kept > 0 && `, ${marks.kept} kept from before`}
      </span>
    </p>
  );
}

const INKS = { within: 'text-verdigris', close: 'text-ochre-ink', over: 'text-madder' } as const;

function Governing({ summary: { governing, failed } }: { readonly summary: RevisionDetail['summary'] }) {
  if (governing === null) return <span className="text-pencil">No checks</span>;
  const standing = failed > 0 ? 'over' : standingOf(governing.utilisation);
  return (
    <span>
      Governs <span className={`font-semibold ${INKS[standing]}`}>{formatUtilisation(governing.utilisation)}</span>{' '}
      <a href={`#${blockId(governing.path)}`} className="hover:text-copper">
        {governing.label}
      </a>
    </span>
  );
}

/** The moves that this state knows for this person. One that is refused shows why, and its dialog says it again. */
function Moves({ reference, detail }: StripParts) {
  const [open, setOpen] = useState<Move | null>(null);
  const { moves } = detail.may;
  if (moves.length === 0) return null;
  const refused = moves.filter(({ allowed }) => !allowed);
  return (
    <div className="shrink-0 wide:max-w-[24rem] wide:text-right">
      <div className="flex flex-wrap gap-2 wide:justify-end">
        {moves.map(({ move, allowed }) => (
          <Button
            key={move}
            variant={MOVES[move].signsAs === null ? 'plain' : allowed ? 'primary' : 'muted'}
            aria-describedby={allowed ? undefined : 'refused-moves'}
            onClick={() => setOpen(move)}
          >
            {MOVES[move].button}
          </Button>
        ))}
      </div>
      {refused.length > 0 && (
        <ul id="refused-moves" className="mt-1.5 text-[0.8125rem] text-pencil">
          {refused.map(({ move, why }) => (
            <li key={move}>
              {MOVES[move].button}: {why}
            </li>
          ))}
        </ul>
      )}
      {open !== null && <MoveDialog reference={reference} detail={detail} move={open} onClose={() => setOpen(null)} />}
    </div>
  );
}
