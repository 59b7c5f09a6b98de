import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { RevisionDetail, Transition } from '../../../../schemas/api.ts';
import { sendJson } from '../../../lib/api-client.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { revisionOptions, revisionPath } from './get-revision.ts';
import { revisionListOptions } from './list-revisions.ts';

/** Moves a revision to its next state. Never optimistic: a signature is there when the server says so. */
export function useMoveRevision(ref: RevisionRef) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: Transition) => sendJson<RevisionDetail>('POST', `${revisionPath(ref)}/transitions`, body),
    onSuccess: async (detail) => {
      queryClient.setQueryData(revisionOptions(ref).queryKey, detail);
      await Promise.all([
        queryClient.invalidateQueries(revisionListOptions(ref.study, ref.number)),
        // The desk and the register show the same state; they belong to other features and are named by their keys.
        queryClient.invalidateQueries({ queryKey: ['desk'] }),
        queryClient.invalidateQueries({ queryKey: ['studies', 'detail', ref.study] }),
      ]);
    },
  });
}
