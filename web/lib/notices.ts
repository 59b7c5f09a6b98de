import { useSyncExternalStore } from 'react';

export interface Notice {
  readonly id: number;
  readonly kind: 'error' | 'info';
  readonly text: string;
}

/** What the page has to say that belongs to no place on it: failures rolled back, and words for screen readers. */
interface Notices {
  readonly shown: readonly Notice[];
  readonly spoken: string;
}

const SHOWN_FOR = 8000;

let notices: Notices = { shown: [], spoken: '' };
let lastId = 0;
const listeners = new Set<() => void>();

export function notify(kind: Notice['kind'], text: string): void {
  const notice = { id: ++lastId, kind, text };
  set({ ...notices, shown: [...notices.shown.slice(-2), notice] });
  // An error stays until it is read: it says what was undone.
  if (kind === 'info') setTimeout(() => dismiss(notice.id), SHOWN_FOR);
}

export function dismiss(id: number): void {
  set({ ...notices, shown: notices.shown.filter((notice) => notice.id !== id) });
}

/** Says something to screen readers alone. */
export function announce(text: string): void {
  // A live region speaks only what changes: the same words twice differ by a space that is not spoken.
  set({ ...notices, spoken: notices.spoken === text ? `${text}\u00a0` : text });
}

export function useNotices(): Notices {
  return useSyncExternalStore(subscribe, () => notices);
}

function set(next: Notices): void {
  notices = next;
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
