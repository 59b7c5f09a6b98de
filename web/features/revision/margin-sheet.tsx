import type { Block } from '../../../core/report/model.ts';
import { count } from '../../lib/words.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog } from '../../ui/dialog.tsx';
import { NoteGroupView, type NoteGroupProps } from './note-group-view.tsx';
import type { NoteGroup } from './notes.ts';

interface MarginSheetProps extends Omit<NoteGroupProps, 'group'> {
  readonly groups: readonly NoteGroup[];
  readonly current: Block | undefined;
  readonly isMarked: boolean;
  readonly isOpen: boolean;
  readonly onOpen: (isOpen: boolean) => void;
  readonly onMark: () => void;
  readonly onRemark: () => void;
  readonly onSelect: (path: string) => void;
}

/** The margin of a small screen: a bar on the lower edge for the current block, and a sheet that rises from it. */
export function MarginSheet(props: MarginSheetProps) {
  const { groups, current, isMarked, isOpen, onOpen, onMark, onRemark, actions } = props;
  const remarks = groups.flatMap((group) => group.remarks).length;
  return (
    <>
      <div className="fixed inset-x-0 bottom-0 z-30 flex items-center gap-2 border-t border-rule bg-sheet px-3 py-2 print:hidden">
        <span className="min-w-0 grow truncate text-[0.8125rem] text-pencil">
          {current?.label ?? 'Tap a block to choose it'}
        </span>
        {current !== undefined && actions.may.mark && (
          <Button small aria-pressed={isMarked} onClick={onMark}>
            {isMarked ? '✓ marked' : 'Mark'}
          </Button>
        )}
        {current !== undefined && actions.may.remark && (
          <Button small onClick={onRemark}>
            Remark
          </Button>
        )}
        <Button small variant="primary" onClick={() => onOpen(true)}>
          {count(remarks, 'remark')}
        </Button>
      </div>
      {isOpen && (
        <Dialog title="Remarks" form="sheet" onClose={() => onOpen(false)}>
          <SheetNotes {...props} />
        </Dialog>
      )}
    </>
  );
}

function SheetNotes({ groups, current, onSelect, onOpen, reference, actions, onCloseComposer }: MarginSheetProps) {
  if (groups.length === 0) return <p className="text-pencil">No remarks on this revision.</p>;
  const first = groups.filter((group) => group.path === current?.path);
  const others = groups.filter((group) => group.path !== current?.path);
  return (
    <div className="flex flex-col gap-5">
      {[...first, ...others].map((group) => (
        <section key={group.path} aria-label={group.label}>
          <button
            type="button"
            className="mb-1 cursor-pointer text-left font-semibold underline decoration-rule underline-offset-4"
            onClick={() => {
              onOpen(false);
              onSelect(group.path);
            }}
          >
            {group.label}
          </button>
          <NoteGroupView reference={reference} group={group} actions={actions} onCloseComposer={onCloseComposer} />
        </section>
      ))}
    </div>
  );
}
