import type { Span } from '../diagnostics/diagnostic.ts';

/** A formula's text and where it stands in the sheet. */
export interface SourceText {
  readonly text: string;
  readonly span: Span;
}

/**
 * Place of a stretch of the formula in the sheet. Where YAML escapes or folds the text, offsets do not carry over, and
 * the place is that of the whole formula.
 */
export function spanIn({ text, span }: SourceText, start: number, end: number): Span {
  if (span.end - span.start !== text.length) return span;
  return { file: span.file, start: span.start + start, end: span.start + end };
}
