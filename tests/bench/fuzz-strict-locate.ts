import type { Diagnostic, Span } from '../../core/diagnostics/diagnostic.ts';
import * as plain from '../../core/diagnostics/locate.ts';

/**
 * Stands in for `core/diagnostics/locate.ts` in the workers of the run. That one moves a place outside the text to the
 * nearest inside; here such a span is a fault of who made it.
 */
export * from '../../core/diagnostics/locate.ts';

type TextOf = Parameters<typeof plain.locateDiagnostic>[1];

export const locateDiagnostic: typeof plain.locateDiagnostic = (diagnostic, textOf) => {
  demandSpans(diagnostic, textOf);
  return plain.locateDiagnostic(diagnostic, textOf);
};

export const locateDiagnostics: typeof plain.locateDiagnostics = (diagnostics, textOf) => {
  for (const diagnostic of diagnostics) demandSpans(diagnostic, textOf);
  return plain.locateDiagnostics(diagnostics, textOf);
};

function demandSpans({ code, span, labels }: Diagnostic, textOf: TextOf): void {
  for (const one of [span, ...labels.map((label) => label.span)]) demandSpan(code, one, textOf(one.file));
}

function demandSpan(code: string, { file, start, end }: Span, text: string | undefined): void {
  if (text === undefined) throw new Error(`${code}: a span in \`${file}\`, of which there is no text`);
  if (Number.isInteger(start) && Number.isInteger(end) && 0 <= start && start <= end && end <= text.length) return;
  throw new Error(`${code}: the span ${start} to ${end} is not in the ${text.length} characters of \`${file}\``);
}
