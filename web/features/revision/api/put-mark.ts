import { useMutation } from '@tanstack/react-query';
import type { Mark, MarkRequest, Person } from '../../../../schemas/api.ts';
import { sendJson } from '../../../lib/api-client.ts';
import { withMark, withoutMark } from '../patch-detail.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { useOptimistic } from '../use-optimistic.ts';
import { revisionPath } from './get-revision.ts';

export function usePutMark(ref: RevisionRef, me: Person) {
  const { key, patch, rollBack, settle } = useOptimistic(ref);
  return useMutation({
    mutationKey: key,
    mutationFn: (body: MarkRequest) => sendJson<Mark>('PUT', `${revisionPath(ref)}/marks`, body),
    onMutate: async ({ path, digest }) => {
      const mark: Mark = { path, digest, person: me, time: new Date().toISOString(), keptFrom: null };
      await patch((detail) => withMark(detail, mark));
      return mark;
    },
    onError: (error, _body, mark) => {
      if (mark !== undefined) rollBack((detail) => withoutMark(detail, mark), error, 'The mark was taken back');
    },
    onSettled: settle,
  });
}
