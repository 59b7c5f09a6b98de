import type { ReportDifference } from '../../core/report/compare-reports.ts';
import type { LocatedDiagnostic, Report } from '../../core/report/model.ts';
import type { SourceFile } from '../../core/seal/model.ts';

/** What the worker is asked: evaluate the sheet and, where a report came with it, hold that against the result. */
export interface Task {
  readonly entry: string;
  readonly files: readonly SourceFile[];
  /** As it was sent, of any shape. */
  readonly claimed?: unknown;
}

export interface Outcome {
  /** Null when the sheet has errors. */
  readonly report: Report | null;
  readonly diagnostics: readonly LocatedDiagnostic[];
  /** What is wrong with the shape of the claimed report; absent where nothing is. */
  readonly fault?: string;
  readonly differences: readonly ReportDifference[];
}

export type Answer =
  | { readonly answer: 'ready' }
  | { readonly answer: 'outcome'; readonly outcome: Outcome }
  | { readonly answer: 'failed'; readonly message: string };
