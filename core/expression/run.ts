import type { AxisTable } from '../axes/axis.ts';
import type { Column } from '../axes/column.ts';
import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { Arena } from './arena.ts';
import { Findings } from './findings.ts';
import type { Program, Source, Stage } from './program.ts';
import { reduceColumn } from './reduce-column.ts';
import { runKernel } from './run-kernel.ts';
import { axisValues, pickColumn } from './pick-column.ts';

export interface RunResult {
  /** SI values; NaN where a fault is reported, or where a value that is read is itself NaN. */
  readonly column: Column;
  readonly diagnostics: readonly Diagnostic[];
}

/**
 * Runs a program over all cases.
 *
 * @param columns the quantities by slot
 * @param axes    the axes that any of them varies along
 * @param arena   memory for the results, shared by the formulas of one evaluation
 */
export function run(
  program: Program,
  columns: readonly (Column | undefined)[],
  axes: AxisTable,
  arena = new Arena(),
): RunResult {
  const temps: Column[] = [];
  const findings = new Findings();
  const read = (source: Source): Column => {
    const column = 'slot' in source ? columns[source.slot] : temps[source.temp];
    if (column === undefined)
      throw new Error(`no values for ${'slot' in source ? source.name : `stage ${source.temp}`}`);
    return column;
  };
  for (const stage of program.stages) temps[stage.to] = runStage(stage, read, axes, findings, arena);
  return { column: read(program.result), diagnostics: findings.all() };
}

function runStage(
  stage: Stage,
  read: (source: Source) => Column,
  axes: AxisTable,
  findings: Findings,
  arena: Arena,
): Column {
  switch (stage.stage) {
    case 'kernel':
      return runKernel(stage.kernel, stage.kernel.inputs.map(read), axes, findings, arena);
    case 'reduce':
      return reduceColumn(read(stage.from), stage.over, stage.how, axes);
    case 'pick':
      return pickColumn(read(stage.from), stage.axis, stage.index, axes);
    case 'count':
      return axisValues(stage.axis, axes);
  }
}
