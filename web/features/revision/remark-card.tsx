import { useState } from 'react';
import type { Remark } from '../../../schemas/api.ts';
import { shortName } from '../../lib/words.ts';
import { Button } from '../../ui/button.tsx';
import { Time } from '../../ui/time.tsx';
import { isPending } from './api/create-remark.ts';
import { ReplyForm } from './reply-form.tsx';
import type { RemarkActions } from './remark-actions.ts';
import { WEIGHT_LOOKS } from './weights.ts';

const STATES: Readonly<Record<Remark['state'], string>> = {
  open: '○ open',
  answered: '↩ answered',
  resolved: '✓ resolved',
};

interface RemarkCardProps {
  readonly remark: Remark;
  readonly actions: RemarkActions;
}

/** One remark with its thread. A resolved one is folded to a line. */
export function RemarkCard({ remark, actions }: RemarkCardProps) {
  const { glyph, ink, rule } = WEIGHT_LOOKS[remark.weight];
  const head = (
    <span className="flex flex-wrap justify-between gap-x-3">
      <span className={`font-semibold ${ink}`}>
        <span aria-hidden="true">{glyph}</span> {remark.weight}
      </span>
      <span className="text-pencil">
        {shortName(remark.person.name)} · <Time iso={remark.time} />
      </span>
    </span>
  );
  if (remark.state === 'resolved') {
    return (
      <details className="border-t-2 border-rule bg-sheet px-3 py-2 text-[0.8125rem]">
        <summary className="cursor-pointer text-pencil">
          {STATES.resolved}: {remark.weight}, {shortName(remark.person.name)}
        </summary>
        <div className="mt-2">
          {head}
          <Thread remark={remark} actions={actions} />
        </div>
      </details>
    );
  }
  return (
    <article
      className={`border-t-2 bg-sheet px-3 py-2 text-[0.8125rem] ${rule} ${isPending(remark) ? 'opacity-60' : ''}`}
      aria-label={`Remark, ${remark.weight}, by ${remark.person.name}`}
    >
      {head}
      <Thread remark={remark} actions={actions} />
    </article>
  );
}

function Thread({ remark, actions }: RemarkCardProps) {
  return (
    <>
      <p className="mt-1 text-sm break-words whitespace-pre-wrap">{remark.text}</p>
      {remark.replies.map((reply, index) => (
        <div key={index} className="mt-2 border-l-2 border-rule pl-2.5">
          <p className="text-pencil">
            {shortName(reply.person.name)} · <Time iso={reply.time} />
          </p>
          <p className="break-words whitespace-pre-wrap">{reply.text}</p>
        </div>
      ))}
      <CardFoot remark={remark} actions={actions} />
    </>
  );
}

function CardFoot({ remark, actions }: RemarkCardProps) {
  const [isReplying, setReplying] = useState(() => actions.hasReplyDraft(remark));
  if (isPending(remark)) return <p className="mt-1 text-pencil">sending…</p>;
  if (isReplying) return <ReplyForm remark={remark} actions={actions} onClose={() => setReplying(false)} />;
  return (
    <div className="mt-1.5 -mb-1 flex flex-wrap items-center gap-x-1">
      <span className="text-pencil">
        {STATES[remark.state]}
        {remark.revision !== actions.revision && `, from revision ${remark.revision}`}
      </span>
      <span className="ml-auto flex">
        {actions.may.remark && remark.state !== 'resolved' && (
          <Button small variant="quiet" onClick={() => setReplying(true)}>
            Answer
          </Button>
        )}
        {actions.may.resolve && (
          <Button
            small
            variant="quiet"
            onClick={() => actions.onChange(remark, remark.state === 'resolved' ? 'open' : 'resolved')}
          >
            {remark.state === 'resolved' ? 'Reopen' : 'Resolve'}
          </Button>
        )}
      </span>
    </div>
  );
}
