import { evaluateSheet } from '../../../core/evaluate/evaluate-sheet.ts';
import type { EvaluateRequest, Evaluation } from '../../../core/evaluate/request.ts';
import type { Report } from '../../../core/report/model.ts';

/** Lines that every sheet of these tests begins with. */
const HEAD = [
  'antinode: sheet/1',
  'number: T-1',
  'title: Test',
  'units: us',
  'atmosphere: 14.7 psia',
  'sources: { b: Basis }',
];

/** A sheet of its own lines, behind the head; what is given again replaces nothing. */
export function sheetOf(...lines: readonly string[]): string {
  return [...HEAD, ...lines].join('\n');
}

export function evaluateText(
  text: string,
  more: Partial<EvaluateRequest> = {},
  beside: Readonly<Record<string, string>> = {},
): Evaluation {
  const files = [
    { name: 's.yaml', text },
    ...Object.entries(beside).map(([name, content]) => ({ name, text: content })),
  ];
  return evaluateSheet({ entry: 's.yaml', files, ...more });
}

export function reportOf(evaluation: Evaluation): Report {
  if (evaluation.report !== null) return evaluation.report;
  throw new Error(evaluation.diagnostics.map(({ line, message }) => `${line}: ${message}`).join('\n'));
}

/** Code and place of every diagnostic: `AXIS_MISSING 9:20`. */
export function places({ diagnostics }: Evaluation): string[] {
  return diagnostics.map(({ code, line, column }) => `${code} ${line}:${column}`);
}
