import { useMutation } from '@tanstack/react-query';
import { getText } from '../../../lib/api-client.ts';
import type { RevisionRef } from '../revision-ref.ts';
import { revisionPath } from './get-revision.ts';

/** Fetches the bundle and hands it to the browser as a file. Fetched first, so that a refusal is told and never saved. */
export function useDownloadBundle(ref: RevisionRef) {
  return useMutation({
    mutationFn: () => getText(`${revisionPath(ref)}/bundle`),
    onSuccess: (text) => saveAs(`${ref.number}-${ref.revision}.bundle.json`, text),
  });
}

function saveAs(name: string, text: string): void {
  const url = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  URL.revokeObjectURL(url);
}
