import { useMutation } from '@tanstack/react-query';
import type { NewRemark, Person, Remark } from '../../../../schemas/api.ts';
import { sendJson } from '../../../lib/api-client.ts';
import { withoutRemark, withRemark } from '../patch-detail.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { useOptimistic } from '../use-optimistic.ts';
import { revisionPath } from './get-revision.ts';

/** Ids of remarks that the server has not answered yet begin with this. */
const PENDING = 'pending-';
let pendingCount = 0;

export function isPending(remark: Remark): boolean {
  return remark.id.startsWith(PENDING);
}

export function useCreateRemark(ref: RevisionRef, me: Person) {
  const { key, patch, rollBack, settle } = useOptimistic(ref);
  return useMutation({
    mutationKey: key,
    mutationFn: (body: NewRemark) => sendJson<Remark>('POST', `${revisionPath(ref)}/remarks`, body),
    onMutate: async (body) => {
      const remark = pendingRemark(body, me, ref.revision);
      await patch((detail) => withRemark(detail, remark));
      return remark;
    },
    onSuccess: (remark, _body, pending) => patch((detail) => withRemark(withoutRemark(detail, pending.id), remark)),
    onError: (error, _body, pending) => {
      if (pending === undefined) return;
      rollBack((detail) => withoutRemark(detail, pending.id), error, 'The remark was not sent, its text is kept');
    },
    onSettled: settle,
  });
}

function pendingRemark(body: NewRemark, me: Person, revision: string): Remark {
  const id = `${PENDING}${++pendingCount}`;
  return { ...body, id, person: me, time: new Date().toISOString(), state: 'open', replies: [], etag: '', revision };
}
