import type { DiagnosticCode } from './codes.ts';
import type { Severity } from './diagnostic.ts';

/** A diagnostic as reports and APIs carry it: places as file, line and column (from 1), with the line's text. */
export interface LocatedDiagnostic {
  readonly code: DiagnosticCode;
  readonly severity: Severity;
  readonly message: string;
  readonly file: string;
  readonly line: number;
  readonly column: number;
  /** Number of characters underlined, at least 1. */
  readonly length: number;
  readonly excerpt: string;
  /** Column of the excerpt's first character, where the line was too long to be carried whole; else 1. */
  readonly excerptColumn?: number;
  readonly hints: readonly string[];
  readonly labels: readonly {
    readonly file: string;
    readonly line: number;
    readonly column: number;
    readonly text: string;
  }[];
}
