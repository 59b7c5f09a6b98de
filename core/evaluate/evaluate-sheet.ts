import { error, hasErrors, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { locate, locateDiagnostic } from '../diagnostics/locate.ts';
import { LIBRARY } from '../library/catalogue.ts';
import { buildReport } from '../report/build-report.ts';
import type { EvaluatedSheet } from '../report/evaluated-sheet.ts';
import type { SheetDocument } from '../sheet/document.ts';
import { parseSheet } from '../sheet/parse-sheet.ts';
import type { Site } from '../units/site.ts';
import { assembleSheet } from './assemble-sheet.ts';
import { checkLabels } from './check-labels.ts';
import { checkTypes } from './check-types.ts';
import { compute } from './compute.ts';
import { readFormulas } from './read-formulas.ts';
import { readGases } from './read-gases.ts';
import { overrideFile, readAtmosphere, readInputs } from './read-values.ts';
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
  const { sheet, diagnostics } = text === undefined ? missingFile(request.entry) : evaluateText(text, request);
  const located = diagnostics.map((diagnostic) => locateDiagnostic(diagnostic, (file) => texts.get(file)));
  if (sheet === null || text === undefined) return { report: null, diagnostics: located };
  return { report: buildReport(sheet, (offset) => locate(text, offset).line, located), diagnostics: located };
}

interface Outcome {
  readonly sheet: EvaluatedSheet | null;
  readonly diagnostics: readonly Diagnostic[];
}

function missingFile(entry: string): Outcome {
  const span = { file: entry, start: 0, end: 0 };
  return { sheet: null, diagnostics: [error('FILE_NOT_FOUND', span, `there is no file \`${entry}\``)] };
}

function evaluateText(text: string, request: EvaluateRequest): Outcome {
  const parsed = parseSheet(request.entry, text);
  if (parsed.value === undefined) return { sheet: null, diagnostics: parsed.diagnostics };
  return evaluateDocument(parsed.value, parsed.diagnostics, request);
}

function evaluateDocument(
  document: SheetDocument,
  parseDiagnostics: readonly Diagnostic[],
  request: EvaluateRequest,
): Outcome {
  const units = request.units === document.units ? undefined : request.units;
  const atmosphere = readAtmosphere(document, units);
  const site: Site = atmosphere.value === undefined ? {} : { atmosphere: atmosphere.value.si };
  const inputs = readInputs(document, request.overrides ?? [], site, units);
  const gases = readGases(document);
  const formulas = readFormulas(document);
  const typed = checkTypes(formulas, {
    document,
    inputs: new Map([...inputs.inputs].map(([name, { value }]) => [name, value.type])),
    gases: new Set(document.gases.map((gas) => gas.name.text)),
    functions: LIBRARY,
    hasAtmosphere: atmosphere.value !== undefined || document.atmosphere !== undefined,
  });
  const phases = [atmosphere, inputs, gases, formulas, typed].flatMap((phase) => phase.diagnostics);
  const found = [...parseDiagnostics, ...checkLabels(document), ...phases];
  if (hasErrors(found)) return { sheet: null, diagnostics: found };

  const computed = compute(typed, {
    inputs: new Map([...inputs.inputs].map(([name, { value }]) => [name, value.si])),
    gases: new Map([...gases.gases].map(([name, { model }]) => [name, model])),
    functions: LIBRARY,
    site,
  });
  const diagnostics = [...found, ...computed.diagnostics];
  if (hasErrors(diagnostics)) return { sheet: null, diagnostics };
  const sheet = assembleSheet({
    document,
    units: request.units ?? document.units,
    shownIn: units,
    atmosphere: atmosphere.value,
    site,
    inputs,
    gases,
    formulas,
    typed,
    computed,
  });
  return { sheet, diagnostics };
}
