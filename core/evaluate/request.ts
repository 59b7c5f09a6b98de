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

/** The texts of a request by the name of their file; a value set from outside stands for a file of its own. */
export function requestTexts({ files, overrides = [] }: EvaluateRequest): ReadonlyMap<string, string> {
  const texts = new Map(files.map(({ name, text }) => [name, text]));
  for (const { name, value } of overrides) texts.set(overrideFile(name), value);
  return texts;
}

/** Stands as the file's name in the place of a diagnostic about a value set from outside the sheet. */
export const overrideFile = (name: string): string => `--set ${name}`;

export interface Evaluation {
  /** Null when the sheet has an error. */
  readonly report: Report | null;
  readonly diagnostics: readonly LocatedDiagnostic[];
}
