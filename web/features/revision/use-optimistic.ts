import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { RevisionDetail } from '../../../schemas/api.ts';
import { notify } from '../../lib/notices.ts';
import { wordsOf } from '../../lib/problem.ts';
import { revisionOptions } from './api/get-revision.ts';
import type { RevisionRef } from './revision-ref.ts';

type Patch = (detail: RevisionDetail) => RevisionDetail;

export interface Optimistic {
  readonly key: readonly string[];
  readonly patch: (patch: Patch) => Promise<void>;
  /** Undoes a patch by its opposite, so that other changes made meanwhile stand, and says what was undone. */
  readonly rollBack: (undo: Patch, error: unknown, what: string) => void;
  /** Asks the server for the truth, once the last of several changes under way has been answered. */
  readonly settle: () => Promise<void>;
}

/** The way in which marks and remarks show at once, and are taken back with a message when the server refuses them. */
export function useOptimistic(ref: RevisionRef): Optimistic {
  const queryClient = useQueryClient();
  const options = revisionOptions(ref);
  const key = ['change', ref.study, ref.number, ref.revision];
  const apply = (patch: Patch) =>
    queryClient.setQueryData(options.queryKey, (detail) => (detail === undefined ? detail : patch(detail)));
  return {
    key,
    patch: async (patch) => {
      await queryClient.cancelQueries(options);
      apply(patch);
    },
    rollBack: (undo, error, what) => {
      apply(undo);
      notify('error', `${what}: ${wordsOf(error)}`);
    },
    settle: () => settle(queryClient, key, options),
  };
}

async function settle(
  queryClient: QueryClient,
  key: readonly string[],
  options: ReturnType<typeof revisionOptions>,
): Promise<void> {
  if (queryClient.isMutating({ mutationKey: key }) <= 1) await queryClient.invalidateQueries(options);
}
