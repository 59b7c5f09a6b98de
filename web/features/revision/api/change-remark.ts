import { useMutation } from '@tanstack/react-query';
import type { Remark, RemarkChange } from '../../../../schemas/api.ts';
import { api, sendJson } from '../../../lib/api-client.ts';
import { withRemark } from '../patch-detail.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { useOptimistic } from '../use-optimistic.ts';

interface Change extends RemarkChange {
  readonly remark: Remark;
}

/** Resolves or reopens a remark, unless somebody has changed it since it was read. */
export function useChangeRemark(ref: RevisionRef) {
  const { key, patch, rollBack, settle } = useOptimistic(ref);
  return useMutation({
    mutationKey: key,
    mutationFn: ({ remark, state }: Change) =>
      sendJson<Remark>(
        'PATCH',
        api`/studies/${ref.study}/sheets/${ref.number}/${ref.revision}/remarks/${remark.id}`,
        { state },
        remark.etag,
      ),
    onMutate: ({ remark, state }) => patch((detail) => withRemark(detail, { ...remark, state })),
    onSuccess: (remark) => patch((detail) => withRemark(detail, remark)),
    onError: (error, { remark }) => rollBack((detail) => withRemark(detail, remark), error, 'The remark is as it was'),
    onSettled: settle,
  });
}
