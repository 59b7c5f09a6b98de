import { queryOptions, useQuery } from '@tanstack/react-query';
import type { DeviceInquiry } from '../../../../schemas/api.ts';
import { api, getJson } from '../../../lib/api-client.ts';

export function inquiryOptions(userCode: string) {
  return queryOptions({
    queryKey: ['device', 'detail', userCode],
    queryFn: ({ signal }) => getJson<DeviceInquiry>(api`/device/${userCode}`, signal),
    enabled: userCode !== '',
    retry: false,
  });
}

export function useInquiry(userCode: string) {
  return useQuery(inquiryOptions(userCode));
}
