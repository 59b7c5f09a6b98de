import type { AxisTable } from '../axes/axis.ts';
import { exceeds, type Column } from '../axes/column.ts';
import { cellCount, gatherIndex, unionShape, type Shape } from '../axes/shape.ts';
import type { ComparisonOperator } from '../expression/tree.ts';
import { judge, type Judgement } from './judge-check.ts';

/** A check over all its cells: it passes only if it passes everywhere, and one cell governs. */
export interface ColumnJudgement extends Judgement {
  readonly axes: Shape;
  /** The cell with the highest utilisation; among cells that fail, if there are any. */
  readonly cell: number;
  readonly cells: number;
  readonly failures: number;
}

export function judgeColumn(
  operator: ComparisonOperator,
  left: Column,
  right: Column,
  axes: AxisTable,
): ColumnJudgement {
  const shape = unionShape(left.axes, right.axes);
  const [leftPlaces, rightPlaces] = [gatherIndex(left.axes, shape, axes), gatherIndex(right.axes, shape, axes)];
  const judged = (cell: number): Judgement =>
    judge(operator, left.data[leftPlaces[cell] ?? 0] ?? Number.NaN, right.data[rightPlaces[cell] ?? 0] ?? Number.NaN);
  let [worst, worstCell, failures] = [judged(0), 0, 0];
  const cells = cellCount(shape, axes);
  for (let cell = 0; cell < cells; cell += 1) {
    const judgement = judged(cell);
    if (!judgement.passes) failures += 1;
    if (!isWorse(judgement, worst)) continue;
    worst = judgement;
    worstCell = cell;
  }
  return { ...worst, axes: shape, cell: worstCell, cells, failures };
}

function isWorse(a: Judgement, b: Judgement): boolean {
  if (a.passes !== b.passes) return !a.passes;
  if (a.utilisation === null || b.utilisation === null) return a.utilisation !== null;
  return exceeds(a.utilisation, b.utilisation);
}
