import type { Column } from '../axes/column.ts';
import { hasErrors, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { lineFinder, locateDiagnostics } from '../diagnostics/locate.ts';
import { buildReport } from '../report/build-report.ts';
import type { EvaluatedSheet } from '../report/evaluated-sheet.ts';
import { assembleSheet } from './assemble-sheet.ts';
import { checkExpected } from './check-expected.ts';
import { checkHeld } from './check-held.ts';
import { compute } from './compute.ts';
import { prepareSheet, shownIn, type Prepared } from './prepare-sheet.ts';
import { requestTexts, type EvaluateRequest, type Evaluation } from './request.ts';

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
  const texts = requestTexts(request);
  const { prepared, diagnostics } = prepareSheet(request, texts);
  const outcome = prepared === null ? { sheet: null, diagnostics: [] } : evaluatePrepared(prepared, request);
  const textOf = (file: string): string | undefined => texts.get(file);
  const located = locateDiagnostics([...diagnostics, ...outcome.diagnostics], textOf);
  if (outcome.sheet === null) return { report: null, diagnostics: located };
  return { report: buildReport(outcome.sheet, lineFinder(textOf), located), diagnostics: located };
}

interface Outcome {
  readonly sheet: EvaluatedSheet | null;
  readonly diagnostics: readonly Diagnostic[];
}

function evaluatePrepared(prepared: Prepared, request: EvaluateRequest): Outcome {
  const { document, typed, givens, expected } = prepared;
  const { axes, site } = givens;
  const computed = compute(typed, givens);
  if (hasErrors(computed.diagnostics)) return { sheet: null, diagnostics: computed.diagnostics };
  const values = new Map<string, Column>([...givens.inputs, ...computed.steps]);
  const believed = checkExpected(expected, values, axes, site);
  const sheet = assembleSheet({
    ...prepared,
    units: request.units ?? document.units,
    shownIn: shownIn(document, request),
    site,
    axes,
    computed,
    expectations: believed.within,
  });
  const diagnostics = [...computed.diagnostics, ...believed.diagnostics, ...checkHeld(sheet)];
  return { sheet: hasErrors(diagnostics) ? null : sheet, diagnostics };
}
