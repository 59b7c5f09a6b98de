import { useState, type FormEvent } from 'react';
import type { Move, RevisionDetail } from '../../../schemas/api.ts';
import { announce } from '../../lib/notices.ts';
import { hasCode, wordsOf } from '../../lib/problem.ts';
import { count, shortDigest } from '../../lib/words.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog } from '../../ui/dialog.tsx';
import { Field, TextField } from '../../ui/field.tsx';
import { useMoveRevision } from './api/move-revision.ts';
import { MOVES } from './moves.ts';
import type { RevisionRef } from './revision-ref.ts';

interface MoveDialogProps {
  readonly reference: RevisionRef;
  readonly detail: RevisionDetail;
  readonly move: Move;
  readonly onClose: () => void;
}

/** Says what a move means, and makes it. A move that is refused says why instead. */
export function MoveDialog({ reference, detail, move, onClose }: MoveDialogProps) {
  const words = MOVES[move];
  const permission = detail.may.moves.find((other) => other.move === move);
  return (
    <Dialog title={words.title} onClose={onClose}>
      <p>{words.meaning}</p>
      <Facts detail={detail} />
      {permission?.allowed === true ? (
        <MoveForm reference={reference} move={move} onClose={onClose} />
      ) : (
        <>
          <p className="border border-ochre px-4 py-3">
            <span className="font-semibold text-ochre-ink">Not now.</span> {permission?.why ?? 'This move is not open.'}
          </p>
          <div className="mt-5 flex justify-end">
            <Button onClick={onClose}>Close</Button>
          </div>
        </>
      )}
    </Dialog>
  );
}

function Facts({ detail: { summary } }: { readonly detail: RevisionDetail }) {
  const facts = [
    ['Revision', `${summary.number} rev ${summary.revision}, ${summary.title}`],
    ['Checks', `${summary.passed} within, ${summary.failed} over`],
    [
      'Open',
      `${count(summary.holds, 'hold')}, ${count(summary.remarks.open, 'remark')} (${summary.remarks.mustFix} must fix)`,
    ],
    ['Manifest', shortDigest(summary.manifest)],
  ] as const;
  return (
    <dl className="my-4 grid grid-cols-[5.5rem_1fr] gap-y-1 border-y border-rule py-3">
      {facts.map(([term, value]) => (
        <div key={term} className="contents">
          <dt className="text-pencil">{term}</dt>
          <dd className={term === 'Manifest' ? 'font-mono text-[0.8125rem]' : ''}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

type MoveFormProps = Pick<MoveDialogProps, 'reference' | 'move' | 'onClose'>;

function MoveForm({ reference, move, onClose }: MoveFormProps) {
  const { note: noteWords, signsAs, confirm, done } = MOVES[move];
  const [note, setNote] = useState('');
  const [password, setPassword] = useState('');
  const send = useMoveRevision(reference);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = signsAs === null ? { move, note } : { move, note, password };
    send.mutate(body, {
      onSuccess: () => {
        announce(`Revision ${reference.revision} is ${done}.`);
        onClose();
      },
    });
  };
  const isWrong = hasCode(send.error, 'wrong-password');
  return (
    <form onSubmit={submit} className="flex flex-col gap-4">
      <TextField
        label={noteWords.label}
        hint={noteWords.isRequired ? undefined : 'Optional; it stands in the record.'}
        required={noteWords.isRequired}
        maxLength={2000}
        value={note}
        onChange={(event) => setNote(event.target.value)}
      />
      {signsAs !== null && (
        <Field
          label="Your password"
          hint={`Asked again, because your key signs as ${signsAs}.`}
          type="password"
          autoComplete="current-password"
          required
          value={password}
          onChange={(event) => setPassword(event.target.value)}
          fault={send.isError && isWrong ? wordsOf(send.error) : null}
        />
      )}
      {send.isError && !isWrong && (
        <p role="alert" className="text-madder">
          <span aria-hidden="true">▲</span> {wordsOf(send.error)}
        </p>
      )}
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onClose}>Not yet</Button>
        <Button type="submit" variant="primary" disabled={send.isPending}>
          {send.isPending ? 'Signing…' : confirm}
        </Button>
      </div>
    </form>
  );
}
