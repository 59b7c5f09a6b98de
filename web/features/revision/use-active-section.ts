import { useEffect, useState } from 'react';
import { blockId } from '../../report/block-id.ts';

/** Height, from the top of the window, at which a heading counts as reached. */
const READING_LINE = 200;

/** Path of the section that is being read: the last whose heading has passed the reading line. */
export function useActiveSection(paths: readonly string[]): string | undefined {
  const [active, setActive] = useState(paths[0]);
  useEffect(() => {
    let frame = 0;
    const find = () => {
      frame = 0;
      setActive(paths.findLast((path) => topOf(path) < READING_LINE) ?? paths[0]);
    };
    const schedule = () => {
      if (frame === 0) frame = requestAnimationFrame(find);
    };
    schedule();
    window.addEventListener('scroll', schedule, { passive: true });
    return () => {
      window.removeEventListener('scroll', schedule);
      cancelAnimationFrame(frame);
    };
  }, [paths]);
  return active;
}

function topOf(path: string): number {
  return document.getElementById(blockId(path))?.getBoundingClientRect().top ?? Infinity;
}
