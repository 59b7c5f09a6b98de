import { error, warning, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import type { FunctionNotice } from '../library/function.ts';

/** A call, as far as messages about it need it. */
export interface CallPlace {
  readonly span: Span;
  readonly argumentSpans: readonly Span[];
}

/** What a function says about its arguments, put in its place in the formula. */
export function noticeDiagnostics(
  notices: readonly FunctionNotice[],
  { span, argumentSpans }: CallPlace,
): Diagnostic[] {
  return notices.map(({ code, severity, message, hints = [], argument }) => {
    const place = (argument === undefined ? undefined : argumentSpans[argument]) ?? span;
    return severity === 'error' ? error(code, place, message, { hints }) : warning(code, place, message, { hints });
  });
}

export function notFinite(span: Span): Diagnostic {
  return error('RESULT_NOT_FINITE', span, 'the result is too large to be held', {
    hints: ['look for a wrong power or unit among the values'],
  });
}
