import type { Block } from '../../../core/report/model.ts';
import type { Mark } from '../../../schemas/api.ts';
import { formatDay } from '../../lib/dates.ts';

interface MarkButtonProps {
  readonly block: Block;
  /** The mark that stands on the block; undefined where it has none. */
  readonly mark: Mark | undefined;
  readonly mayMark: boolean;
  readonly onToggle: (block: Block) => void;
}

/** The tick beside a block. Who may not mark sees only what is marked. */
export function MarkButton({ block, mark, mayMark, onToggle }: MarkButtonProps) {
  const told = mark === undefined ? 'not marked' : tellMark(mark);
  const sign = mark === undefined ? '○' : '✓';
  const ink = mark === undefined ? 'text-pencil text-[0.7rem]' : 'text-verdigris text-base';
  if (!mayMark) {
    return mark === undefined ? null : (
      <span role="img" aria-label={told} title={told} className={`leading-6 ${ink}`}>
        {sign}
      </span>
    );
  }
  return (
    <button
      type="button"
      aria-pressed={mark !== undefined}
      aria-label={`Mark ${block.label}`}
      title={told}
      onClick={() => onToggle(block)}
      className={`size-6 cursor-pointer rounded-full leading-none hover:bg-wash hover:text-copper ${ink} ${mark !== undefined && mark.keptFrom !== null ? 'opacity-75' : ''}`}
    >
      {sign}
    </button>
  );
}

export function tellMark({ person, time, keptFrom }: Mark): string {
  const kept = keptFrom === null ? '' : `, kept from revision ${keptFrom}: unchanged since`;
  return `marked by ${person.name}, ${formatDay(time)}${kept}`;
}
