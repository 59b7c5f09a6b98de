import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { StudyDetail } from '../../../../schemas/api.ts';
import { api, getJson } from '../../../lib/api-client.ts';

export function studyOptions(study: string) {
  return queryOptions({
    queryKey: ['studies', 'detail', study],
    queryFn: ({ signal }) => getJson<StudyDetail>(api`/studies/${study}`, signal),
  });
}

export function useStudy(study: string): StudyDetail {
  return useSuspenseQuery(studyOptions(study)).data;
}
