import { sameShape, type Shape } from '../axes/shape.ts';
import { error, hasErrors, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { GasColumn } from '../expression/gas-column.ts';
import type { GasModel } from '../gas/gas-model.ts';
import { LIBRARY } from '../library/catalogue.ts';
import type { EvaluatedColumn, EvaluatedLookup, EvaluatedTake, Value } from '../report/evaluated-sheet.ts';
import type { SheetDocument } from '../sheet/document.ts';
import { LOCK_FILE, nameBeside } from '../sheet/file-names.ts';
import { parseSheet } from '../sheet/parse-sheet.ts';
import { readExpected, type Expectations } from './check-expected.ts';
import { checkLabels } from './check-labels.ts';
import { checkShown } from './check-shown.ts';
import { checkTypes, type TypedSheet } from './check-types.ts';
import type { Givens } from './compute.ts';
import { Overrides } from './overrides.ts';
import { readAxes } from './read-axes.ts';
import { readColumns } from './read-columns.ts';
import { readFormulas, type ReadFormulas } from './read-formulas.ts';
import { readGases, type Gases } from './read-gases.ts';
import { readLookups } from './read-lookups.ts';
import { readSite, statedSite, type ReadSite } from './read-site.ts';
import { readTolerances, type Uncertain } from './read-tolerances.ts';
import { readTakes } from './read-takes.ts';
import { readInputs, type Inputs } from './read-values.ts';
import type { EvaluateRequest } from './request.ts';

/** A sheet of which everything is read and typed, and nothing computed. */
export interface Prepared {
  readonly document: SheetDocument;
  readonly atmosphere: ReadSite['atmosphere'];
  readonly inputs: Inputs;
  readonly columns: readonly EvaluatedColumn[];
  readonly taken: ReadonlyMap<string, EvaluatedTake>;
  readonly lookups: readonly EvaluatedLookup[];
  readonly gases: Gases;
  readonly formulas: ReadFormulas;
  readonly typed: TypedSheet;
  readonly expected: Expectations['expected'];
  readonly uncertain: readonly Uncertain[];
  readonly givens: Givens;
}

export interface Preparation {
  /** Null where the sheet has an error. */
  readonly prepared: Prepared | null;
  readonly diagnostics: readonly Diagnostic[];
}

/**
 * Reads a sheet and checks the dimensions of all its formulas. Each phase runs on what the former could make, so that every
 * fault of the sheet is reported in one go.
 *
 * @param texts the files of the request by name
 */
export function prepareSheet(request: EvaluateRequest, texts: ReadonlyMap<string, string>): Preparation {
  const text = texts.get(request.entry);
  if (text === undefined) {
    const span = { file: request.entry, start: 0, end: 0 };
    return { prepared: null, diagnostics: [error('FILE_NOT_FOUND', span, `there is no file \`${request.entry}\``)] };
  }
  const parsed = parseSheet(request.entry, text, (name) => texts.get(name));
  if (parsed.value === undefined) return { prepared: null, diagnostics: parsed.diagnostics };
  const lockText = texts.get(nameBeside(request.entry, LOCK_FILE) ?? '');
  const { prepared, diagnostics } = prepareDocument(parsed.value, lockText, request);
  const all = [...parsed.diagnostics, ...diagnostics];
  return { prepared: hasErrors(all) ? null : prepared, diagnostics: all };
}

function prepareDocument(
  document: SheetDocument,
  lockText: string | undefined,
  request: EvaluateRequest,
): { readonly prepared: Prepared; readonly diagnostics: readonly Diagnostic[] } {
  const units = shownIn(document, request);
  const overrides = new Overrides(document, request.overrides ?? []);
  const { site, atmosphere, diagnostics: siteFaults } = readSite(document, units);
  const axes = readAxes(document, overrides, request.condition);
  const inputs = readInputs(document, overrides, axes, site, units);
  const gases = readGases(document);
  const models = new Map([...gases.gases].map(([name, { model }]) => [name, model]));
  const gasNames = document.gases.map(({ name }) => name.text);
  const columns = readColumns(document, { overrides, axes: axes.axes, gases: models, gasNames, site, units });
  const takes = readTakes(document, lockText, axes.axes, units);
  const lookups = readLookups(document, site);
  const formulas = readFormulas(document);

  const values = new Map<string, Value>();
  for (const [name, { value }] of [...inputs.inputs, ...takes.taken]) values.set(name, value);
  for (const column of columns.columns)
    if (column.column === 'quantity') values.set(column.node.name.text, column.value);
  const typed = checkTypes(formulas, {
    document,
    inputs: new Map([...values].map(([name, { type }]) => [name, type])),
    shapes: shapesOf(values, columns.gases),
    axes: axes.axes,
    gases: new Set([...gasNames, ...columns.gases.keys()]),
    tables: new Map(lookups.lookups.map(({ table }) => [table.name, table])),
    words: new Set(columns.columns.flatMap(({ column, node }) => (column === 'text' ? [node.name.text] : []))),
    functions: LIBRARY,
    site: statedSite(document, site),
  });
  const expected = readExpected(document, typed.types, site);
  const tolerances = readTolerances(document, values, gases.gases, site);
  const shown = checkShown(document, new Set(typed.types.keys()), typed.faulty, typed.shapes);
  const phases = [axes, inputs, gases, columns, takes, lookups, formulas, typed, expected, tolerances];
  const diagnostics = [
    ...conditionFaults(document, request),
    ...checkLabels(document),
    ...siteFaults,
    ...phases.flatMap((phase) => phase.diagnostics),
    ...shown,
  ];
  const givens: Givens = {
    inputs: new Map([...values].map(([name, { column }]) => [name, column])),
    gases: gasColumns(models, columns.gases),
    functions: LIBRARY,
    site,
    axes: axes.axes,
  };
  const prepared: Prepared = {
    document,
    atmosphere,
    inputs,
    columns: columns.columns,
    taken: takes.taken,
    lookups: lookups.lookups,
    gases,
    formulas,
    typed,
    expected: expected.expected,
    uncertain: tolerances.uncertain,
    givens,
  };
  return { prepared, diagnostics };
}

/** Set where results are to be shown in another system than the sheet's own. */
export function shownIn(document: SheetDocument, { units }: EvaluateRequest): 'us' | 'si' | undefined {
  return units === document.units ? undefined : units;
}

/** The gases that have a name of their own, and the columns of gases. */
function gasColumns(
  models: ReadonlyMap<string, GasModel>,
  columns: ReadonlyMap<string, GasColumn>,
): Map<string, GasColumn> {
  const single = [...models].map(([name, model]): [string, GasColumn] => [name, { axes: [], models: [model] }]);
  return new Map([...single, ...columns]);
}

/** The axes of all that is given and varies. */
function shapesOf(values: ReadonlyMap<string, Value>, gases: ReadonlyMap<string, GasColumn>): Map<string, Shape> {
  const all: [string, Shape][] = [...values].map(([name, { column }]) => [name, column.axes]);
  for (const [name, { axes }] of gases) all.push([name, axes]);
  return new Map(all.filter(([, shape]) => !sameShape(shape, [])));
}

/** An operating condition that is asked for must be one of the sheet. */
function conditionFaults({ conditions, number }: SheetDocument, { condition, entry }: EvaluateRequest): Diagnostic[] {
  if (condition === undefined) return [];
  const ids = (conditions?.ids ?? []).map(({ text }) => text);
  if (ids.includes(condition)) return [];
  const span = number.span.end > 0 ? number.span : { file: entry, start: 0, end: 0 };
  const hint =
    ids.length === 0
      ? 'the sheet has no `conditions`'
      : `its conditions are ${ids.slice(0, 8).join(', ')}${ids.length > 8 ? ', …' : ''}`;
  return [error('OVERRIDE', span, `the sheet has no operating condition \`${condition}\``, { hints: [hint] })];
}
