import { useState } from 'react';
import { notify } from '../lib/notices.ts';
import { Button } from './button.tsx';

/** A command to copy, or a secret that is shown once. */
export function Command({ text }: { readonly text: string }) {
  const [isCopied, setCopied] = useState(false);
  const copy = () => {
    navigator.clipboard.writeText(text).then(
      () => setCopied(true),
      () => notify('error', 'The browser did not allow copying. Select the text and copy it by hand.'),
    );
  };
  return (
    <span className="flex max-w-full items-center gap-1 border border-rule bg-wash py-1 pr-1 pl-3">
      <code className="grow overflow-x-auto py-1 text-[0.8125rem] whitespace-nowrap">{text}</code>
      <Button small variant="quiet" onClick={copy} aria-label={`Copy ${text}`}>
        {isCopied ? 'Copied' : 'Copy'}
      </Button>
    </span>
  );
}
