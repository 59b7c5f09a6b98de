import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { RevisionSummary } from '../../../../schemas/api.ts';
import { api, getJson } from '../../../lib/api-client.ts';

export function revisionListOptions(study: string, number: string) {
  return queryOptions({
    queryKey: ['revisions', 'list', study, number],
    queryFn: ({ signal }) => getJson<readonly RevisionSummary[]>(api`/studies/${study}/sheets/${number}`, signal),
  });
}

/** Revisions of a sheet, newest first. */
export function useRevisionList(study: string, number: string): readonly RevisionSummary[] {
  return useSuspenseQuery(revisionListOptions(study, number)).data;
}
