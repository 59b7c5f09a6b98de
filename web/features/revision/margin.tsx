import { useMemo, useRef } from 'react';
import { NoteGroupView, type NoteGroupProps } from './note-group-view.tsx';
import type { NoteGroup } from './notes.ts';
import { useMarginPlaces } from './use-margin-places.ts';

interface MarginProps extends Omit<NoteGroupProps, 'group'> {
  readonly groups: readonly NoteGroup[];
  readonly current: string | undefined;
  readonly onSelect: (path: string) => void;
}

/** The margin: every note level with the block it speaks of; that of the current block before all others. */
export function Margin({ groups, current, onSelect, ...rest }: MarginProps) {
  const column = useRef<HTMLDivElement>(null);
  const shape = groups.map(({ path }) => path).join(' ');
  const paths = useMemo(() => shape.split(' '), [shape]);
  const { tops, height } = useMarginPlaces(column, paths, current);
  return (
    <aside ref={column} aria-label="Remarks" className="relative print:hidden" style={{ minHeight: height }}>
      {groups.length === 0 && (
        <p className="text-[0.8125rem] text-pencil">
          No remarks. {rest.actions.may.remark && 'Choose a block and press r to write one.'}
        </p>
      )}
      {groups.map((group) => (
        <div
          key={group.path}
          data-note={group.path}
          className={`absolute inset-x-0 transition-[top] duration-150 motion-reduce:transition-none ${group.path === current ? 'shadow-md' : ''}`}
          style={{ top: tops.get(group.path) ?? 0, visibility: tops.has(group.path) ? 'visible' : 'hidden' }}
          onFocus={() => onSelect(group.path)}
          onClick={() => onSelect(group.path)}
        >
          <NoteGroupView group={group} {...rest} />
        </div>
      ))}
    </aside>
  );
}
