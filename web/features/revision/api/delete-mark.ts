import { useMutation } from '@tanstack/react-query';
import type { Mark } from '../../../../schemas/api.ts';
import { sendOnly } from '../../../lib/api-client.ts';
import { withMark, withoutMark } from '../patch-detail.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { useOptimistic } from '../use-optimistic.ts';
import { revisionPath } from './get-revision.ts';

export function useDeleteMark(ref: RevisionRef) {
  const { key, patch, rollBack, settle } = useOptimistic(ref);
  return useMutation({
    mutationKey: key,
    mutationFn: ({ path }: Mark) => sendOnly('DELETE', `${revisionPath(ref)}/marks?path=${encodeURIComponent(path)}`),
    onMutate: (mark) => patch((detail) => withoutMark(detail, mark)),
    onError: (error, mark) => rollBack((detail) => withMark(detail, mark), error, 'The mark stands'),
    onSettled: settle,
  });
}
