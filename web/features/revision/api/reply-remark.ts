import { useMutation } from '@tanstack/react-query';
import type { Person, Remark } from '../../../../schemas/api.ts';
import { api, sendJson } from '../../../lib/api-client.ts';
import { withRemark } from '../patch-detail.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { useOptimistic } from '../use-optimistic.ts';

interface Reply {
  readonly remark: Remark;
  readonly text: string;
}

export function useReplyRemark(ref: RevisionRef, me: Person) {
  const { key, patch, rollBack, settle } = useOptimistic(ref);
  return useMutation({
    mutationKey: key,
    mutationFn: ({ remark, text }: Reply) =>
      sendJson<Remark>(
        'POST',
        api`/studies/${ref.study}/sheets/${ref.number}/${ref.revision}/remarks/${remark.id}/replies`,
        { text },
      ),
    onMutate: ({ remark, text }) => {
      const replies = [...remark.replies, { person: me, time: new Date().toISOString(), text }];
      return patch((detail) => withRemark(detail, { ...remark, replies }));
    },
    onSuccess: (remark) => patch((detail) => withRemark(detail, remark)),
    onError: (error, { remark }) =>
      rollBack((detail) => withRemark(detail, remark), error, 'The answer was not sent, its text is kept'),
    onSettled: settle,
  });
}
