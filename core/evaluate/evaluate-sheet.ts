import { sameShape, type Shape } from '../axes/shape.ts';
import type { Column } from '../axes/column.ts';
import { error, hasErrors, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { locate, locateDiagnostic } from '../diagnostics/locate.ts';
import type { GasColumn } from '../expression/gas-column.ts';
import { LIBRARY } from '../library/catalogue.ts';
import { buildReport } from '../report/build-report.ts';
import type { EvaluatedSheet, Value } from '../report/evaluated-sheet.ts';
import type { SheetDocument } from '../sheet/document.ts';
import { LOCK_FILE, nameBeside } from '../sheet/file-names.ts';
import { parseSheet } from '../sheet/parse-sheet.ts';
import { assembleSheet } from './assemble-sheet.ts';
import { checkHeld } from './check-held.ts';
import { checkExpected, readExpected } from './check-expected.ts';
import { checkLabels } from './check-labels.ts';
import { checkShown } from './check-shown.ts';
import { checkTypes } from './check-types.ts';
import { compute } from './compute.ts';
import { overrideFile, Overrides } from './overrides.ts';
import { readAxes } from './read-axes.ts';
import { readColumns } from './read-columns.ts';
import { readFormulas } from './read-formulas.ts';
import { readGases } from './read-gases.ts';
import { readLookups } from './read-lookups.ts';
import { readSite, statedSite } from './read-site.ts';
import { readTakes } from './read-takes.ts';
import { readInputs } from './read-values.ts';
import type { EvaluateRequest, Evaluation } from './request.ts';

/**
 * The whole life of a sheet inside the core, from text to report. The terminal, the server and the browser call this and
 * nothing else.
 *
 *   text ── parse ──▶ document ── read ──▶ values and formulas ── order, check types ──▶ typed formulas
 *        ── compute ──▶ SI numbers, judged checks ── build ──▶ report
 *
 * Each phase returns what it could make and all that it has to say; the next runs on what there is, so that every fault of
 * the sheet is reported in one go. Nothing is evaluated while a dimension is at fault.
 */
export function evaluateSheet(request: EvaluateRequest): Evaluation {
  const texts = new Map(request.files.map(({ name, text }) => [name, text]));
  for (const { name, value } of request.overrides ?? []) texts.set(overrideFile(name), value);
  const text = texts.get(request.entry);
  const { sheet, diagnostics } = text === undefined ? missingFile(request.entry) : evaluateText(text, texts, request);
  const located = diagnostics.map((diagnostic) => locateDiagnostic(diagnostic, (file) => texts.get(file)));
  if (sheet === null) return { report: null, diagnostics: located };
  const report = buildReport(sheet, ({ file, start }) => locate(texts.get(file) ?? '', start).line, located);
  return { report, diagnostics: located };
}

interface Outcome {
  readonly sheet: EvaluatedSheet | null;
  readonly diagnostics: readonly Diagnostic[];
}

function missingFile(entry: string): Outcome {
  const span = { file: entry, start: 0, end: 0 };
  return { sheet: null, diagnostics: [error('FILE_NOT_FOUND', span, `there is no file \`${entry}\``)] };
}

function evaluateText(text: string, texts: ReadonlyMap<string, string>, request: EvaluateRequest): Outcome {
  const parsed = parseSheet(request.entry, text, (name) => texts.get(name));
  if (parsed.value === undefined) return { sheet: null, diagnostics: parsed.diagnostics };
  return evaluateDocument(
    parsed.value,
    parsed.diagnostics,
    texts.get(nameBeside(request.entry, LOCK_FILE) ?? ''),
    request,
  );
}

function evaluateDocument(
  document: SheetDocument,
  parseDiagnostics: readonly Diagnostic[],
  lockText: string | undefined,
  request: EvaluateRequest,
): Outcome {
  const units = request.units === document.units ? undefined : request.units;
  const overrides = new Overrides(document, request.overrides ?? []);
  const { site, atmosphere, diagnostics: siteDiagnostics } = readSite(document, units);
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
  const phases = [axes, inputs, gases, columns, takes, lookups, formulas, typed, expected].flatMap(
    (phase) => phase.diagnostics,
  );
  const shown = checkShown(document, new Set(typed.types.keys()), typed.faulty, typed.shapes);
  const asked = conditionFaults(document, request);
  const found = [...parseDiagnostics, ...asked, ...checkLabels(document), ...siteDiagnostics, ...phases, ...shown];
  if (hasErrors(found)) return { sheet: null, diagnostics: found };

  const single = [...models].map(([name, model]) => [name, { axes: [], models: [model] }] as const);
  const given = new Map([...values].map(([name, { column }]) => [name, column]));
  const computed = compute(typed, {
    inputs: given,
    gases: new Map<string, GasColumn>([...single, ...columns.gases]),
    functions: LIBRARY,
    site,
    axes: axes.axes,
  });
  if (hasErrors(computed.diagnostics)) return { sheet: null, diagnostics: [...found, ...computed.diagnostics] };
  const believed = checkExpected(
    expected.expected,
    new Map<string, Column>([...given, ...computed.steps]),
    axes.axes,
    site,
  );
  const sheet = assembleSheet({
    document,
    units: request.units ?? document.units,
    shownIn: units,
    atmosphere,
    site,
    axes: axes.axes,
    inputs,
    columns: columns.columns,
    taken: takes.taken,
    lookups: lookups.lookups,
    gases,
    formulas,
    typed,
    computed,
    expectations: believed.within,
  });
  const diagnostics = [...found, ...computed.diagnostics, ...believed.diagnostics, ...checkHeld(sheet)];
  return { sheet: hasErrors(diagnostics) ? null : sheet, diagnostics };
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
