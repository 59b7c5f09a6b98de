import type { LocatedDiagnostic, Report } from '../report/model.ts';

export interface SourceFile {
  readonly name: string;
  readonly text: string;
}

/** A value given from outside the sheet (`run --set p_d=905psig`), in place of the one that is written there. */
export interface Override {
  readonly name: string;
  readonly value: string;
}

export interface EvaluateRequest {
  /** Name of the sheet among `files`. */
  readonly entry: string;
  readonly files: readonly SourceFile[];
  readonly overrides?: readonly Override[];
  /** Evaluates this operating condition alone. */
  readonly condition?: string;
  /** Shows all results in this system, whatever the sheet says. */
  readonly units?: 'us' | 'si';
}

export interface Evaluation {
  /** Null when the sheet has an error. */
  readonly report: Report | null;
  readonly diagnostics: readonly LocatedDiagnostic[];
}
