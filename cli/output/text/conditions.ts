import type { ColumnBlock, InputBlock, ReportAxis } from '../../../core/report/model.ts';
import type { Paint } from '../../terminal.ts';
import { originText } from './basis.ts';
import { gridLines, type GridColumn } from './grid.ts';
import { INDENT, noteLines, padEnd, widest } from './layout.ts';

type ConditionBlock = InputBlock | ColumnBlock;

/** The operating conditions as one table, and under it what each column is and where it is from. */
export function conditionLines(
  blocks: readonly ConditionBlock[],
  axis: ReportAxis | undefined,
  paint: Paint,
): string[] {
  const ids: GridColumn = { head: ['', ''], cells: (axis?.values ?? []).map(String), align: 'left' };
  const columns = blocks.map((block): GridColumn => ({
    head: [
      block.hold === undefined ? block.name : `${block.name} ◔`,
      block.block === 'input' ? block.printed.unit : '',
    ],
    cells: block.cells ?? [],
    align: block.block === 'input' ? 'right' : 'left',
  }));
  return [...gridLines(ids, columns, paint), '', ...legendLines(blocks, paint)];
}

function legendLines(blocks: readonly ConditionBlock[], paint: Paint): string[] {
  const name = widest(blocks.map((block) => block.name));
  const label = widest(blocks.map(labelOf));
  return blocks.flatMap((block) => {
    const origin = originText(block.hold, block.source ?? 'no source', paint);
    const cells = [padEnd(block.name, name), ...(label === 0 ? [] : [padEnd(labelOf(block), label)]), origin];
    return [`${INDENT}${cells.join('  ')}`, ...noteLines(block, paint)];
  });
}

/** A column without a label of its own is called by its name, which stands before it. */
function labelOf({ label, name }: ConditionBlock): string {
  return label === name ? '' : label;
}
