import type { NewRemark, Person, Remark, RevisionDetail } from '../../../schemas/api.ts';
import { readLocal } from '../../lib/local-store.ts';
import { useChangeRemark } from './api/change-remark.ts';
import { useCreateRemark } from './api/create-remark.ts';
import { useReplyRemark } from './api/reply-remark.ts';
import { draftKey } from './drafts.ts';
import type { RevisionRef } from './revision-ref.ts';

/** What can be done with remarks of one revision; handed down to wherever they are shown. */
export interface RemarkActions {
  readonly revision: string;
  readonly may: RevisionDetail['may'];
  readonly onCreate: (remark: NewRemark) => Promise<unknown>;
  readonly onReply: (remark: Remark, text: string) => Promise<unknown>;
  readonly onChange: (remark: Remark, state: 'open' | 'resolved') => void;
  readonly replyKey: (remark: Remark) => string;
  readonly hasReplyDraft: (remark: Remark) => boolean;
}

export function useRemarkActions(ref: RevisionRef, me: Person, may: RevisionDetail['may']): RemarkActions {
  const create = useCreateRemark(ref, me);
  const reply = useReplyRemark(ref, me);
  const change = useChangeRemark(ref);
  const replyKey = (remark: Remark) => draftKey(ref, `remark/${remark.id}`);
  return {
    revision: ref.revision,
    may,
    onCreate: (remark) => create.mutateAsync(remark),
    onReply: (remark, text) => reply.mutateAsync({ remark, text }),
    onChange: (remark, state) => change.mutate({ remark, state }),
    replyKey,
    hasReplyDraft: (remark) => readLocal(replyKey(remark)) !== null,
  };
}
