import type { Report } from '../report/model.ts';
import { digestJson, digestText } from './digest.ts';
import type { Manifest, SourceFile } from './model.ts';

export interface ManifestParts {
  /** Id of the study. */
  readonly study: string;
  readonly revision: string;
  /** The source files, the sheet first. */
  readonly files: readonly SourceFile[];
  readonly report: Report;
  readonly taken: Manifest['taken'];
  /** Digest of the manifest of the revision before; null for the first. */
  readonly previous: string | null;
}

/** The manifest of a revision: all that its signatures cover, as digests and counts. */
export function buildManifest({ study, revision, files, report, taken, previous }: ManifestParts): Manifest {
  return {
    antinode: 'manifest/1',
    study,
    number: report.sheet.number,
    revision,
    sources: files.map(({ name, text }) => ({ name, digest: digestText(text) })),
    taken,
    report: digestJson(report),
    core: report.core,
    checks: countChecks(report),
    holds: report.holds.length,
    previous,
  };
}

export function countChecks({ checks }: Report): Manifest['checks'] {
  const passed = checks.filter(({ status }) => status === 'pass').length;
  return { passed, failed: checks.length - passed };
}
