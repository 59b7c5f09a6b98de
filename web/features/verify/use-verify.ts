import { useMutation } from '@tanstack/react-query';
import { useRef } from 'react';
import type { VerifyAnswer, VerifyRequest } from './protocol.ts';

export interface VerifyInput {
  readonly file: File;
  readonly serverKey: string;
}

/** Runs verification in a worker of its own, which can be stopped. */
export function useVerify() {
  const worker = useRef<Worker | null>(null);
  const stop = () => {
    worker.current?.terminate();
    worker.current = null;
  };
  const mutation = useMutation({
    mutationFn: async ({ file, serverKey }: VerifyInput) => {
      stop();
      const bytes = new Uint8Array(await file.arrayBuffer());
      const started = new Worker(new URL('./verify-worker.ts', import.meta.url), { type: 'module' });
      worker.current = started;
      return ask(started, serverKey === '' ? { file: bytes } : { file: bytes, serverKey });
    },
    onSettled: stop,
  });
  const reset = () => {
    stop();
    mutation.reset();
  };
  return { ...mutation, reset };
}

function ask(worker: Worker, request: VerifyRequest): Promise<Extract<VerifyAnswer, { kind: 'verified' }>> {
  return new Promise((resolve, reject) => {
    worker.addEventListener('message', ({ data }: MessageEvent<VerifyAnswer>) => {
      if (data.kind === 'verified') resolve(data);
      else reject(new Error(data.message));
    });
    worker.addEventListener('error', (event) => reject(new Error(event.message)));
    worker.postMessage(request);
  });
}
