import type { DiagnosticCode } from './codes.ts';

/** A stretch of one source file: UTF-16 offsets, `end` exclusive. */
export interface Span {
  readonly file: string;
  readonly start: number;
  readonly end: number;
}

export type Severity = 'error' | 'warning' | 'info';

/** A second place that helps to understand a diagnostic, such as the first of two duplicate keys. */
export interface Label {
  readonly span: Span;
  readonly text: string;
}

/**
 * Something the user should know about a sheet. Plain data: made by core, worded for people at the edge.
 * `message` says what is (lowercase start, no full stop, code in backticks); the remedy stands only in `hints`.
 */
export interface Diagnostic {
  readonly code: DiagnosticCode;
  readonly severity: Severity;
  readonly message: string;
  readonly span: Span;
  readonly labels: readonly Label[];
  readonly hints: readonly string[];
}

/** What a phase of the core returns: a value where one could be made, and all it has to say. */
export interface Diagnosed<T> {
  readonly value?: T;
  readonly diagnostics: readonly Diagnostic[];
}

/** Optional parts of a diagnostic. */
export interface DiagnosticParts {
  readonly hints?: readonly string[];
  readonly labels?: readonly Label[];
}

export function error(code: DiagnosticCode, span: Span, message: string, parts: DiagnosticParts = {}): Diagnostic {
  return { code, severity: 'error', message, span, labels: parts.labels ?? [], hints: parts.hints ?? [] };
}

export function warning(code: DiagnosticCode, span: Span, message: string, parts: DiagnosticParts = {}): Diagnostic {
  return { code, severity: 'warning', message, span, labels: parts.labels ?? [], hints: parts.hints ?? [] };
}

export function hasErrors(diagnostics: readonly Diagnostic[]): boolean {
  return diagnostics.some((diagnostic) => diagnostic.severity === 'error');
}
