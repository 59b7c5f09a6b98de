import { useEffect } from 'react';

export type KeyCommand = 'next' | 'previous' | 'mark' | 'remark' | 'trace' | 'keys' | 'close';

/** The keys and what they do; the dialog that lists them is drawn from this. */
export const KEYS: readonly { readonly key: string; readonly command: KeyCommand; readonly words: string }[] = [
  { key: 'j', command: 'next', words: 'next block' },
  { key: 'k', command: 'previous', words: 'previous block' },
  { key: 'm', command: 'mark', words: 'mark the block, or take the mark back' },
  { key: 'r', command: 'remark', words: 'write a remark on the block' },
  { key: 't', command: 'trace', words: 'open or close the trace of the block' },
  { key: '?', command: 'keys', words: 'list the keys' },
  { key: 'Escape', command: 'close', words: 'close what is open' },
];

/** Calls back for each key of the table, unless the person is typing or a dialog has the keyboard. */
export function useKeyboard(onCommand: (command: KeyCommand) => void): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return;
      const command = KEYS.find(({ key }) => key === event.key)?.command;
      if (command === undefined || isElsewhere(event.target)) return;
      event.preventDefault();
      onCommand(command);
    };
    document.addEventListener('keydown', listen);
    return () => document.removeEventListener('keydown', listen);
  }, [onCommand]);
}

function isElsewhere(target: EventTarget | null): boolean {
  if (document.querySelector('dialog[open]') !== null) return true;
  return target instanceof HTMLElement && target.closest('input, textarea, select, [contenteditable]') !== null;
}
