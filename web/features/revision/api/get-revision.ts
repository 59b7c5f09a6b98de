import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { RevisionDetail } from '../../../../schemas/api.ts';
import { api, getJson } from '../../../lib/api-client.ts';
import type { RevisionRef } from '../revision-ref.ts';

export function revisionPath({ study, number, revision }: RevisionRef): string {
  return api`/studies/${study}/sheets/${number}/${revision}`;
}

export function revisionOptions(ref: RevisionRef) {
  return queryOptions({
    queryKey: ['revisions', 'detail', ref.study, ref.number, ref.revision],
    queryFn: ({ signal }) => getJson<RevisionDetail>(revisionPath(ref), signal),
  });
}

export function useRevision(ref: RevisionRef): RevisionDetail {
  return useSuspenseQuery(revisionOptions(ref)).data;
}
