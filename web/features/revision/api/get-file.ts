import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getText } from '../../../lib/api-client.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { revisionPath } from './get-revision.ts';

export function fileOptions(ref: RevisionRef, name: string) {
  return queryOptions({
    queryKey: ['files', 'detail', ref.study, ref.number, ref.revision, name],
    queryFn: ({ signal }) => getText(`${revisionPath(ref)}/files/${encodeURIComponent(name)}`, signal),
    // The sources of a revision never change.
    staleTime: Infinity,
  });
}

export function useFile(ref: RevisionRef, name: string): string {
  return useSuspenseQuery(fileOptions(ref, name)).data;
}
