import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, sendOnly } from '../../../lib/api-client.ts';
import { inquiryOptions } from './get-inquiry.ts';

export function useDecideDevice(userCode: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (approve: boolean) => sendOnly('POST', api`/device/${userCode}`, { approve }),
    onSettled: () => queryClient.invalidateQueries(inquiryOptions(userCode)),
  });
}
