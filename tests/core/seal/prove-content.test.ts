import { describe, expect, it } from 'vitest';
import { sealBundle, type BundleParts } from '../../../core/seal/seal-bundle.ts';
import { verifyBundle } from '../../../core/seal/verify-bundle.ts';
import { FILES, sameReport, sampleManifest, sampleParts } from './sample-bundle.ts';
import { SAMPLE_REPORT } from './sample-report.ts';
import { failures, makeSample, verifyStudy } from './sample-verification.ts';

const { keys, parts, verifySealed } = await makeSample();

describe('content', () => {
  it('an altered source file is found, and named', async () => {
    const [sheet, basis] = FILES;
    const altered = [sheet, { ...basis, text: basis?.text.replace('533', '433') ?? '' }] as BundleParts['files'];
    expect(failures(await verifySealed({ files: altered }))).toEqual(['Source file “basis.yaml”: invalid']);
  });

  it.each<[string, BundleParts['files']]>([
    ['in another order', [...FILES].reverse()],
    ['one fewer', FILES.slice(0, 1)],
  ])('source files %s are found', async (_, files) => {
    expect(failures(await verifySealed({ files }))).toEqual(['List of source files: invalid']);
  });

  it('a file that the manifest does not list is found', async () => {
    const files = [...FILES, { name: 'extra.yaml', text: '' }];
    const expected = ['List of source files: invalid', 'Source file “extra.yaml”: invalid'];
    expect(failures(await verifySealed({ files }))).toEqual(expected);
  });

  it('two files of one name are refused even when the manifest lists them', async () => {
    const files = [...FILES, ...FILES.slice(1)];
    expect(failures(await verifyStudy(keys, SAMPLE_REPORT, files))).toEqual(['List of source files: not allowed']);
  });

  it('an altered report is found', async () => {
    const report = { ...SAMPLE_REPORT, cautions: [] };
    const verification = await verifyBundle(await sealBundle({ ...parts, report }, keys.server), () => ({
      report,
      diagnostics: [],
    }));
    expect(failures(verification)).toEqual(['Digest of the report: invalid']);
  });

  it.each<[string, Partial<BundleParts['manifest']>]>([
    ['number', { number: 'TH3-C-105' }],
    ['core', { core: '9.9.9' }],
    ['checks', { checks: { passed: 2, failed: 0 } }],
    ['holds', { holds: 1 }],
  ])('a manifest that differs from its report in %s is found', async (_, changes) => {
    const altered = await sampleParts(keys, sampleManifest(changes));
    const verification = await verifyBundle(await sealBundle(altered, keys.server), sameReport);
    expect(failures(verification)).toContain('Report and manifest agree: invalid');
  });
});
