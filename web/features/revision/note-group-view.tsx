import type { NoteGroup } from './notes.ts';
import type { RemarkActions } from './remark-actions.ts';
import { RemarkCard } from './remark-card.tsx';
import { RemarkComposer } from './remark-composer.tsx';
import type { RevisionRef } from './revision-ref.ts';

export interface NoteGroupProps {
  readonly reference: RevisionRef;
  readonly group: NoteGroup;
  readonly actions: RemarkActions;
  readonly onCloseComposer: (path: string) => void;
}

/** The remarks on one block, and the one that is being written. */
export function NoteGroupView({ reference, group, actions, onCloseComposer }: NoteGroupProps) {
  return (
    <div className="flex flex-col gap-2">
      {group.asks !== null && (
        <p className="border-t-2 border-ochre bg-sheet px-3 py-2 text-[0.8125rem]">
          <span className="font-semibold text-ochre-ink">
            <span aria-hidden="true">△</span> not expected
          </span>{' '}
          {group.asks}
        </p>
      )}
      {group.remarks.map((remark) => (
        <RemarkCard key={remark.id} remark={remark} actions={actions} />
      ))}
      {group.isComposing && (
        <RemarkComposer
          reference={reference}
          path={group.path}
          label={group.label}
          onSend={actions.onCreate}
          onClose={() => onCloseComposer(group.path)}
        />
      )}
    </div>
  );
}
