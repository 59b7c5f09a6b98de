import { useState, type FormEvent, type KeyboardEvent } from 'react';
import type { NewRemark, Remark } from '../../../schemas/api.ts';
import { Button } from '../../ui/button.tsx';
import { draftKey, useDraft } from './drafts.ts';
import type { RevisionRef } from './revision-ref.ts';
import { WEIGHT_LOOKS, WEIGHTS } from './weights.ts';

interface RemarkComposerProps {
  readonly reference: RevisionRef;
  readonly path: string;
  readonly label: string;
  /** Sends the remark; settles when the server has answered. */
  readonly onSend: (remark: NewRemark) => Promise<unknown>;
  readonly onClose: () => void;
}

/** A new remark on one block. Its text is kept in this browser until the server has it. */
export function RemarkComposer({ reference, path, label, onSend, onClose }: RemarkComposerProps) {
  const { text, setText, clear } = useDraft(draftKey(reference, path));
  const [weight, setWeight] = useState<Remark['weight']>('question');
  const [isSending, setSending] = useState(false);
  const send = () => {
    if (text.trim() === '' || isSending) return;
    setSending(true);
    onSend({ path, weight, text: text.trim() }).then(
      () => {
        clear();
        onClose();
      },
      () => setSending(false),
    );
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    send();
  };
  return (
    <form onSubmit={submit} className="border-t-2 border-copper bg-sheet px-3 pt-2 pb-3" hidden={isSending}>
      <fieldset className="mb-2 flex flex-wrap gap-x-4">
        <legend className="sr-only">Weight of the remark</legend>
        {WEIGHTS.map((choice) => (
          <label
            key={choice}
            className={`flex min-h-7 cursor-pointer items-center gap-1 ${weight === choice ? 'font-semibold' : ''}`}
          >
            <input
              type="radio"
              name={`weight ${path}`}
              className="m-1 ml-0 size-4 accent-copper"
              checked={weight === choice}
              onChange={() => setWeight(choice)}
            />
            <span className={WEIGHT_LOOKS[choice].ink}>
              <span aria-hidden="true">{WEIGHT_LOOKS[choice].glyph}</span> {choice}
            </span>
          </label>
        ))}
      </fieldset>
      <textarea
        aria-label={`Remark on ${label}`}
        className="block w-full resize-y border border-pencil/60 bg-sheet px-2 py-1.5"
        rows={3}
        autoFocus
        maxLength={4000}
        value={text}
        onChange={(event) => setText(event.target.value)}
        onKeyDown={(event) => onComposerKey(event, send, onClose)}
      />
      <div className="mt-2 flex justify-end gap-2">
        <Button small variant="quiet" onClick={() => discard(clear, onClose)}>
          Discard
        </Button>
        <Button small type="submit" variant="primary" disabled={text.trim() === ''}>
          Remark
        </Button>
      </div>
    </form>
  );
}

function discard(clear: () => void, onClose: () => void): void {
  clear();
  onClose();
}

/** Ctrl or Command with Enter sends; Escape closes and keeps the draft. */
export function onComposerKey(event: KeyboardEvent, send: () => void, close: () => void): void {
  if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) {
    event.preventDefault();
    send();
  }
  if (event.key === 'Escape') {
    event.preventDefault();
    close();
  }
}
