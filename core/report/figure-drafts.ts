import { axisLength, axisPoints, pointText, type Axis, type AxisName } from '../axes/axis.ts';
import { extremes } from '../axes/column.ts';
import { cellText } from '../axes/points.ts';
import { gatherIndex, sameShape, type Shape } from '../axes/shape.ts';
import { expressionTex } from '../expression/tex.ts';
import type { TableNode } from '../sheet/document.ts';
import { roundTo } from '../numeric/round.ts';
import { fromSi } from '../units/convert.ts';
import { place, plainText, type Draft, type DraftContext } from './draft.ts';
import { conditionNumber } from './condition-drafts.ts';
import type { EvaluatedFigure, Value } from './evaluated-sheet.ts';
import type { FigureBlock, ReportAxis } from './model.ts';
import { printCell, printInput } from './print-value.ts';
import { symbolic, usedPaths } from './section-drafts.ts';
import { valueOf, type NamedValue } from './values.ts';

/** What each kind of figure runs along; the others run along the innermost axis. */
const ALONG: Readonly<Partial<Record<FigureBlock['kind'], AxisName>>> = {
  spectrum: 'harmonic',
  wave: 'angle',
  profile: 'place',
};

export function figureDraft(path: string, figure: EvaluatedFigure, context: DraftContext): Draft {
  const { node, of, value, limit } = figure;
  const { axes } = value.column;
  const kind = node.kind.text as FigureBlock['kind'];
  const along = ALONG[kind] ?? axes.at(-1) ?? 'condition';
  const across = axes.find((name) => name !== along);
  const limits = limit === null ? undefined : valuesAlong(limit.value, along, context);
  const formula = expressionTex(of, symbolic(context));
  const uses = usedPaths(limit === null ? [of] : [of, limit.expression], value.unit.gauge, context);
  const { greatest } = extremes(value.column);
  return {
    block: {
      block: 'figure',
      path,
      label: node.title?.text ?? plainText(node.of.text),
      ...(node.note === undefined ? {} : { note: node.note.text }),
      kind,
      of: plainText(node.of.text),
      formula,
      unit: value.unit.text === '1' ? '' : value.unit.text,
      x: reportAxis(axisOf(along, context)),
      series: seriesOf(value, along, across, context),
      ...(across === undefined ? {} : { seriesAxis: across }),
      ...(limits === undefined || limit === null
        ? {}
        : {
            limit: {
              of: plainText(node.limit?.text ?? ''),
              formula: expressionTex(limit.expression, symbolic(context)),
              values: limits,
            },
          }),
      greatest: {
        printed: printCell(value, greatest, undefined, context),
        at: cellText(greatest, axes, context.sheet.axes),
      },
      uses,
      place: place(node.of, context),
    },
    content: {
      block: 'figure',
      kind: node.kind.text,
      of: plainText(node.of.text),
      limit: node.limit === undefined ? null : plainText(node.limit.text),
      unit: node.unit?.text ?? null,
      title: node.title?.text ?? null,
      note: node.note?.text ?? null,
    },
    uses,
  };
}

export function reportAxis(axis: Axis): ReportAxis {
  const values = axisPoints(axis);
  if ('ids' in axis || axis.unit.text === '1') return { name: axis.name, values };
  return { name: axis.name, values, unit: axis.unit.text };
}

function axisOf(name: AxisName, { sheet }: DraftContext): Axis {
  const axis = sheet.axes.get(name);
  if (axis === undefined) throw new Error(`no axis ${name}`);
  return axis;
}

function seriesOf(
  value: Value,
  along: AxisName,
  across: AxisName | undefined,
  context: DraftContext,
): FigureBlock['series'] {
  if (across === undefined) return [{ label: '', values: valuesAlong(value, along, context) }];
  const [lines, points] = [axisOf(across, context), axisLength(axisOf(along, context))];
  const values = spread(value, [across, along], context);
  return Array.from({ length: axisLength(lines) }, (_, i) => ({
    label: pointText(lines, i),
    values: values.slice(i * points, (i + 1) * points),
  }));
}

/** A single value stands for the whole of an axis that it does not vary along. */
function valuesAlong(value: Value, along: AxisName, context: DraftContext): number[] {
  const inner = value.column.axes.filter((name) => name === along);
  if (!sameShape(inner, value.column.axes)) return valuesAcross(value, context);
  return value.column.axes.length === 0 ? numbers(value, [0], context) : spread(value, [along], context);
}

/** A limit that varies along the second axis as well is drawn where it is lowest. */
function valuesAcross(value: Value, context: DraftContext): number[] {
  return numbers(value, [extremes(value.column).least], context);
}

/** The values in the figure's unit, over two axes in the order of `shape`, which need not be that of the column. */
function spread(value: Value, shape: readonly AxisName[], context: DraftContext): number[] {
  const { axes } = context.sheet;
  const isInOrder = sameShape(shape, value.column.axes);
  if (isInOrder) return numbers(value, value.column.data.keys(), context);
  const [outer = 'condition', inner = 'condition'] = shape;
  const canonical: Shape = value.column.axes;
  const [outerPlaces, innerPlaces] = [gatherIndex([outer], canonical, axes), gatherIndex([inner], canonical, axes)];
  const width = axisLength(axisOf(inner, context));
  const order = new Array<number>(value.column.data.length);
  for (let cell = 0; cell < order.length; cell += 1)
    order[(outerPlaces[cell] ?? 0) * width + (innerPlaces[cell] ?? 0)] = cell;
  return numbers(value, order, context);
}

function numbers({ column, unit }: Value, cells: Iterable<number>, { sheet }: DraftContext): number[] {
  return Array.from(cells, (cell) => roundTo(fromSi(column.data[cell] ?? Number.NaN, unit, sheet.site), 9));
}

export function tableDraft(path: string, node: TableNode, context: DraftContext): Draft {
  const { axes } = context.sheet;
  const columns = node.of.flatMap(({ text }) => {
    const named = valueOf(text, context.sheet);
    return named === undefined ? [] : [{ name: text, ...named }];
  });
  const shape = columns.find(({ value }) => value.column.axes.length > 0)?.value.column.axes ?? [];
  const [axisName] = shape;
  const axis = axisName && axes.get(axisName);
  const rows = Array.from({ length: axis === undefined ? 1 : axisLength(axis) }, (_, row) => ({
    at: axis === undefined ? '' : pointText(axis, row),
    cells: columns.map((column) => cellNumber(column, row, context)),
  }));
  const uses = columns.flatMap(({ name }) => context.pathOf(name) ?? []);
  const [first] = node.of;
  return {
    block: {
      block: 'table',
      path,
      label: node.title?.text ?? 'Table',
      ...(node.note === undefined ? {} : { note: node.note.text }),
      ...(axisName === undefined ? {} : { axis: axisName }),
      columns: columns.map(({ name, value }) => ({
        name,
        label: labelOf(name, context),
        symbol: context.symbolOf(name),
        unit: value.unit.text === '1' ? '' : value.unit.text,
      })),
      rows,
      uses,
      place: place(first ?? context.sheet.document.title, context),
    },
    content: {
      block: 'table',
      of: node.of.map(({ text }) => text),
      title: node.title?.text ?? null,
      note: node.note?.text ?? null,
    },
    uses,
  };
}

/** A typed value keeps its digits in a table too. */
function cellNumber(
  { name, value, digits, typed }: NamedValue & { readonly name: string },
  row: number,
  context: DraftContext,
): string {
  const column = context.sheet.columns.find(({ node }) => node.name.text === name);
  if (column?.column === 'quantity') return conditionNumber(column, row, context);
  if (value.column.axes.length === 0) return printInput(value, typed, digits, context).number;
  return printCell(value, row, digits, context).number;
}

function labelOf(name: string, { sheet }: DraftContext): string {
  const node =
    sheet.inputs.get(name)?.node ??
    sheet.steps.get(name)?.node ??
    sheet.taken.get(name)?.node ??
    sheet.columns.find((column) => column.node.name.text === name)?.node;
  return node?.label?.text ?? name;
}
