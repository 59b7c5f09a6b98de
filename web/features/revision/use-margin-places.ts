import { useLayoutEffect, useState, type RefObject } from 'react';
import { blockId } from '../../report/block-id.ts';
import { placeNotes } from './place-notes.ts';

const GAP = 12;

export interface MarginPlaces {
  /** Tops by path; empty before the first measure. */
  readonly tops: ReadonlyMap<string, number>;
  /** Height that the column must have to hold all notes. */
  readonly height: number;
}

const NOWHERE: MarginPlaces = { tops: new Map(), height: 0 };

/**
 * Keeps the notes of the margin level with their blocks: measured again whenever the report or a note changes its size,
 * as fonts arrive, traces open and replies are written. Notes carry `data-note` with the path of their block.
 */
export function useMarginPlaces(
  column: RefObject<HTMLElement | null>,
  paths: readonly string[],
  pinned: string | undefined,
): MarginPlaces {
  const [places, setPlaces] = useState(NOWHERE);
  useLayoutEffect(() => {
    const element = column.current;
    const report = document.querySelector('.an-report');
    if (element === null || report === null) return;
    const notes = [...element.querySelectorAll<HTMLElement>('[data-note]')];
    const observer = new ResizeObserver(() => {
      const found = measure(element, notes, pinned);
      setPlaces((known) => (isSame(known, found) ? known : found));
    });
    for (const watched of [report, ...notes]) observer.observe(watched);
    return () => observer.disconnect();
  }, [column, paths, pinned]);
  return places;
}

function measure(column: HTMLElement, elements: readonly HTMLElement[], pinned: string | undefined): MarginPlaces {
  const origin = column.getBoundingClientRect().top;
  const notes = elements.map((element) => {
    const id = element.dataset['note'] ?? '';
    const block = document.getElementById(blockId(id));
    const anchor = block === null ? 0 : block.getBoundingClientRect().top - origin;
    return { id, anchor, height: element.offsetHeight };
  });
  const tops = placeNotes(notes, { gap: GAP, pinned });
  const height = Math.max(0, ...notes.map((note) => (tops.get(note.id) ?? 0) + note.height));
  return { tops, height };
}

function isSame(a: MarginPlaces, b: MarginPlaces): boolean {
  return (
    a.height === b.height && a.tops.size === b.tops.size && [...b.tops].every(([id, top]) => a.tops.get(id) === top)
  );
}
