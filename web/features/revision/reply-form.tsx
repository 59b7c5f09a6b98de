import { useState, type FormEvent } from 'react';
import type { Remark } from '../../../schemas/api.ts';
import { Button } from '../../ui/button.tsx';
import { useDraft } from './drafts.ts';
import type { RemarkActions } from './remark-actions.ts';
import { onComposerKey } from './remark-composer.tsx';

interface ReplyFormProps {
  readonly remark: Remark;
  readonly actions: RemarkActions;
  readonly onClose: () => void;
}

export function ReplyForm({ remark, actions, onClose }: ReplyFormProps) {
  const { text, setText, clear } = useDraft(actions.replyKey(remark));
  const [isSending, setSending] = useState(false);
  const send = () => {
    if (text.trim() === '' || isSending) return;
    setSending(true);
    actions.onReply(remark, text.trim()).then(
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
    <form onSubmit={submit} className="mt-2" hidden={isSending}>
      <textarea
        aria-label="Answer to the remark"
        className="block w-full resize-y border border-pencil/60 bg-sheet px-2 py-1.5 text-sm"
        rows={2}
        autoFocus
        maxLength={4000}
        value={text}
        onChange={(event) => setText(event.target.value)}
        onKeyDown={(event) => onComposerKey(event, send, onClose)}
      />
      <div className="mt-1.5 flex justify-end gap-2">
        <Button small variant="quiet" onClick={onClose}>
          Later
        </Button>
        <Button small type="submit" variant="primary" disabled={text.trim() === ''}>
          Answer
        </Button>
      </div>
    </form>
  );
}
