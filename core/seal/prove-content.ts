import { digestJson, digestText } from './digest.ts';
import { countChecks } from './manifest.ts';
import type { Bundle, Manifest, Proof } from './model.ts';
import { invalid, judge, notAllowed, quote, unless } from './verdict.ts';

/** That the carried files and report are those of the manifest. Whether the manifest is the signed one is proved apart. */
export function proveContent({ manifest, files, report }: Bundle): readonly Proof[] {
  const digests = new Map(manifest.sources.map(({ name, digest }) => [name, digest]));
  return [
    proveFileList(manifest, files),
    ...files.map(({ name, text }) => proveFile(name, text, digests.get(name))),
    judge(
      'Digest of the report',
      unless(digestJson(report) === manifest.report, invalid('the report is not the one of the manifest')),
      'the report is the one of the manifest',
    ),
    proveAgreement(manifest, report),
  ];
}

function proveFileList({ sources }: Manifest, files: Bundle['files']): Proof {
  const listed = sources.map(({ name }) => name);
  const carried = files.map(({ name }) => name);
  const same = listed.length === carried.length && listed.every((name, index) => name === carried[index]);
  return judge(
    'List of source files',
    [
      ...unless(same, invalid('the files are not those of the manifest in its order')),
      ...unless(new Set(carried).size === carried.length, notAllowed('two files have the same name')),
    ],
    `${files.length} ${files.length === 1 ? 'file' : 'files'}, as the manifest lists them`,
  );
}

function proveFile(name: string, text: string, recorded: string | undefined): Proof {
  const detail = recorded === undefined ? 'the manifest lists no such file' : 'its text is not the one of the manifest';
  return judge(
    `Source file ${quote(name)}`,
    unless(recorded === digestText(text), invalid(detail)),
    'its text is the one of the manifest',
  );
}

function proveAgreement(manifest: Manifest, report: Bundle['report']): Proof {
  const { summary } = report;
  const counted = countChecks(report);
  const sameChecks = [manifest.checks, summary].every(
    ({ passed, failed }) => passed === counted.passed && failed === counted.failed,
  );
  const sameHolds = [manifest.holds, summary.holds].every((count) => count === report.holds.length);
  return judge(
    'Report and manifest agree',
    [
      ...unless(report.sheet.number === manifest.number, invalid('their document numbers differ')),
      ...unless(report.core === manifest.core, invalid('their versions of the core differ')),
      ...unless(sameChecks, invalid('their counts of checks differ')),
      ...unless(sameHolds, invalid('their counts of holds differ')),
    ],
    `${quote(manifest.number)} revision ${quote(manifest.revision)}, ${counted.passed} checks pass, ${counted.failed} fail`,
  );
}
