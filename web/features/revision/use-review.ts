import { useCallback, useMemo, useState } from 'react';
import type { Block } from '../../../core/report/model.ts';
import type { Mark, Person, RevisionDetail } from '../../../schemas/api.ts';
import { blockId } from '../../report/block-id.ts';
import { blocksByPath } from '../../report/report-view.tsx';
import { announce } from '../../lib/notices.ts';
import { useDeleteMark } from './api/delete-mark.ts';
import { usePutMark } from './api/put-mark.ts';
import { draftedPaths } from './drafts.ts';
import type { RevisionRef } from './revision-ref.ts';
import { walk } from './walk.ts';

export interface Review {
  readonly blocks: ReadonlyMap<string, Block>;
  readonly current: string | undefined;
  readonly select: (path: string) => void;
  /** Chooses a block and brings it into view. */
  readonly goTo: (path: string) => void;
  readonly step: (by: 1 | -1) => void;
  readonly markOf: ReadonlyMap<string, Mark>;
  readonly toggleMark: (block: Block) => void;
  readonly composing: ReadonlySet<string>;
  readonly compose: (path: string) => void;
  readonly closeComposer: (path: string) => void;
}

/** What a reader of a revision is at: the current block, the marks, the remarks being written. */
export function useReview(ref: RevisionRef, detail: RevisionDetail, me: Person): Review {
  const blocks = useMemo(() => blocksByPath(detail.report), [detail.report]);
  const [current, setCurrent] = useState(() => pathOfHash(blocks));
  const [composing, setComposing] = useState<ReadonlySet<string>>(() => new Set(draftedPaths(ref, [...blocks.keys()])));
  const { markOf, toggleMark } = useMarks(ref, detail, me);
  const select = useCallback((path: string) => {
    setCurrent(path);
    window.history.replaceState(window.history.state, '', `#${blockId(path)}`);
  }, []);
  const goTo = (path: string) => {
    select(path);
    bringIntoView(path);
    announce(`${blocks.get(path)?.label ?? path}, ${markOf.has(path) ? 'marked' : 'not marked'}`);
  };
  return {
    blocks,
    current,
    select,
    goTo,
    step: (by) => {
      const next = walk([...blocks.keys()], current, by);
      if (next !== undefined) goTo(next);
    },
    markOf,
    toggleMark,
    composing,
    compose: (path) => setComposing((paths) => new Set([...paths, path])),
    closeComposer: (path) => setComposing((paths) => new Set([...paths].filter((other) => other !== path))),
  };
}

function useMarks(ref: RevisionRef, { marks }: RevisionDetail, me: Person) {
  const { mutate: put } = usePutMark(ref, me);
  const { mutate: remove } = useDeleteMark(ref);
  // One's own mark before that of another person: it is the one that can be taken back.
  const markOf = useMemo(
    () =>
      new Map(
        marks
          .toSorted((a, b) => Number(a.person.id === me.id) - Number(b.person.id === me.id))
          .map((mark) => [mark.path, mark]),
      ),
    [marks, me.id],
  );
  const toggleMark = useCallback(
    (block: Block) => {
      const mark = markOf.get(block.path);
      if (mark?.person.id === me.id) {
        remove(mark);
        announce(`Mark taken back: ${block.label}`);
      } else {
        put({ path: block.path, digest: block.digest });
        announce(`Marked: ${block.label}`);
      }
    },
    [markOf, me.id, put, remove],
  );
  return { markOf, toggleMark };
}

/** The block that the address points at. */
function pathOfHash(blocks: ReadonlyMap<string, Block>): string | undefined {
  const id = window.location.hash.slice(1);
  return id === '' ? undefined : [...blocks.keys()].find((path) => blockId(path) === id);
}

function bringIntoView(path: string): void {
  const isStill = window.matchMedia('(prefers-reduced-motion: reduce)').matches;
  document.getElementById(blockId(path))?.scrollIntoView({ block: 'center', behavior: isStill ? 'auto' : 'smooth' });
}
