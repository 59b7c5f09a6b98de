import { useState } from 'react';
import { readLocal, writeLocal } from '../../lib/local-store.ts';
import type { RevisionRef } from './revision-ref.ts';

/** Key of what is being written on a block (its path) or in answer to a remark (`remark/` and its id). */
export function draftKey({ study, number, revision }: RevisionRef, subject: string): string {
  return `antinode:draft:${study}/${number}/${revision}:${subject}`;
}

interface Draft {
  readonly text: string;
  readonly setText: (text: string) => void;
  readonly clear: () => void;
}

/** Text that survives a reload and a lost connection. It is cleared when the server has it, and not before. */
export function useDraft(key: string): Draft {
  const [text, setText] = useState(() => readLocal(key) ?? '');
  const keep = (next: string) => {
    setText(next);
    writeLocal(key, next === '' ? null : next);
  };
  return { text, setText: keep, clear: () => keep('') };
}

/** The blocks on which a remark was begun and not sent. */
export function draftedPaths(ref: RevisionRef, paths: readonly string[]): readonly string[] {
  return paths.filter((path) => readLocal(draftKey(ref, path)) !== null);
}
