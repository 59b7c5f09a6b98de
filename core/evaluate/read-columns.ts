import type { Axis, AxisName } from '../axes/axis.ts';
import { error, warning, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { GasColumn } from '../expression/gas-column.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { EvaluatedColumn } from '../report/evaluated-sheet.ts';
import type { ConditionColumnNode, SheetDocument, Text } from '../sheet/document.ts';
import { article, describeType } from '../units/dimensions.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { isRange } from '../units/parse-range.ts';

import type { Site } from '../units/site.ts';
import { unknownUnit } from '../units/unknown-unit.ts';
import type { Overrides } from './overrides.ts';
import { isSameKind, readValue, type TypedValue } from './read-values.ts';

export interface Columns {
  readonly columns: readonly EvaluatedColumn[];
  readonly gases: ReadonlyMap<string, GasColumn>;
  readonly diagnostics: readonly Diagnostic[];
}

/** What the columns of the operating conditions rest on. */
export interface ColumnContext {
  readonly overrides: Overrides;
  readonly axes: ReadonlyMap<AxisName, Axis>;
  readonly gases: ReadonlyMap<string, GasModel>;
  /** All gases of the sheet, well or not. */
  readonly gasNames: readonly string[];
  readonly site: Site;
  readonly units: 'us' | 'si' | undefined;
}

/** Reads the operating conditions, column by column: quantities, gases by name, or words. */
export function readColumns({ conditions }: SheetDocument, context: ColumnContext): Columns {
  const reader = new ColumnReader(
    context,
    (conditions?.ids ?? []).map(({ text }) => text),
  );
  const columns = (conditions?.columns ?? []).flatMap((node) => reader.read(node) ?? []);
  return { columns, gases: reader.gases, diagnostics: reader.diagnostics };
}

const SHAPE: readonly AxisName[] = ['condition'];

class ColumnReader {
  readonly diagnostics: Diagnostic[] = [];
  readonly gases = new Map<string, GasColumn>();
  private readonly context: ColumnContext;
  /** Which rows are evaluated. */
  private readonly rows: readonly number[];

  constructor(context: ColumnContext, ids: readonly string[]) {
    this.context = context;
    const axis = context.axes.get('condition');
    this.rows = axis !== undefined && 'ids' in axis ? axis.ids.map((id) => ids.indexOf(id)) : [];
  }

  read(node: ConditionColumnNode): EvaluatedColumn | undefined {
    const all = this.context.overrides.cellsOf(node);
    const cells = this.rows.flatMap((row) => all[row] ?? []);
    if (node.unit?.text === 'text') return { column: 'text', node, cells };
    return node.unit?.text === 'gas' ? this.gas(node, cells) : this.quantity(node, cells);
  }

  private gas(node: ConditionColumnNode, cells: readonly Text[]): EvaluatedColumn {
    const { gases, gasNames } = this.context;
    for (const cell of cells) {
      if (gasNames.includes(cell.text)) continue;
      const near = nearest(cell.text, gasNames, 2);
      const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : 'define it under `gases`';
      this.diagnostics.push(
        error('GAS_UNKNOWN', cell.span, `the sheet defines no gas \`${cell.text}\``, { hints: [hint] }),
      );
    }
    this.gases.set(node.name.text, { axes: SHAPE, models: cells.flatMap((cell) => gases.get(cell.text) ?? []) });
    return { column: 'gas', node, cells };
  }

  private quantity(node: ConditionColumnNode, cells: readonly Text[]): EvaluatedColumn | undefined {
    const before = this.diagnostics.length;
    const { unit } = node;
    if (unit !== undefined && parseUnit(unit.text) === null) {
      const fault = unknownUnit(unit.text, unit.span);
      const hints = [
        ...fault.hints,
        'a column of gases says `gas`, and one of words says `text`, in the place of a unit',
      ];
      this.diagnostics.push({ ...fault, hints });
      return undefined;
    }
    const values = cells.map((cell) => this.cell(cell, unit));
    const [first] = values;
    values.forEach((value, i) => this.checkKind(value, first, cells[i]));
    if (this.diagnostics.slice(before).some(({ severity }) => severity === 'error') || first === undefined)
      return undefined;
    const data = Float64Array.from(values, (value) => value?.column.data[0] ?? Number.NaN);
    const shown = values.every((value) => value?.unit.text === first.unit.text);
    return {
      column: 'quantity',
      node,
      cells,
      value: { type: first.type, column: { axes: SHAPE, data }, unit: first.unit },
      typed: values.map((value) => (shown ? (value?.typed ?? null) : null)),
    };
  }

  /** A bare number has the unit of its column. */
  private cell(cell: Text, unit: Text | undefined): TypedValue | undefined {
    if (isRange(cell.text)) {
      this.diagnostics.push(
        error('QUANTITY_SYNTAX', cell.span, 'a range stands where one value is wanted', {
          hints: [
            'a range of speeds is an input of its own; limits of each condition are two columns, such as N_min and N_max',
          ],
        }),
      );
      return undefined;
    }
    const isBare = /^\s*[-+−]?[\d.,_/eE+-]+\s*$/.test(cell.text);
    if (isBare && unit === undefined) this.diagnostics.push(...bareNumber(cell));
    const text = isBare && unit !== undefined && unit.text !== '1' ? `${cell.text.trim()} ${unit.text}` : cell.text;
    const { value, diagnostics } = readValue({ text, span: cell.span }, this.context.site, this.context.units);
    this.diagnostics.push(...diagnostics.map((fault) => ({ ...fault, span: cell.span })));
    return value;
  }

  private checkKind(value: TypedValue | undefined, first: TypedValue | undefined, cell: Text | undefined): void {
    if (value === undefined || first === undefined || cell === undefined || isSameKind(value.type, first.type)) return;
    const message = `the column holds ${article(describeType(first.type))}, and here ${article(describeType(value.type))}`;
    this.diagnostics.push(
      error('UNIT_MISMATCH', cell.span, message, { hints: ['all cells of a column are of one kind'] }),
    );
  }
}

function bareNumber(cell: Text): Diagnostic[] {
  return [
    warning('UNIT_MISSING', cell.span, 'a bare number stands in a column without a unit', {
      hints: ['state the unit of the column: `columns: { p_s: psig }`, or `1` if it has none'],
    }),
  ];
}
