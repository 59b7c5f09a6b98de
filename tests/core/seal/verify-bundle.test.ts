import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Report } from '../../../core/report/model.ts';
import { keyId, publicKeyOf } from '../../../core/seal/keys.ts';
import type { Bundle } from '../../../core/seal/model.ts';
import { bundleText, sealBundle } from '../../../core/seal/seal-bundle.ts';
import { verifyBundle } from '../../../core/seal/verify-bundle.ts';
import { EMAILS, FILES, generateKeys, sameReport, sampleBundle, STORY, type Deed } from './sample-bundle.ts';
import { SAMPLE_REPORT } from './sample-report.ts';
import { detail, failures, makeSample, verifyStudy } from './sample-verification.ts';

const { keys, parts, text, verifySealed, withLog } = await makeSample();

describe('a good bundle', () => {
  it('is accepted, as text and as bytes, with every proof explained', async () => {
    for (const file of [text, new TextEncoder().encode(text)]) {
      const verification = await verifyBundle(file, sameReport);
      expect(failures(verification)).toEqual([]);
      expect(verification.valid).toBe(true);
      expect(verification.proofs.every((proof) => proof.detail !== '' && proof.fault === undefined)).toBe(true);
      expect(verification.manifest).toEqual(parts.manifest);
      expect(verification.signers.map(({ role, email }) => [role, email])).toEqual(Object.entries(EMAILS));
      expect(verification.signers[1]?.kid).toBe(await keyId(keys.checker));
      expect(verification.serverKey).toBe(await keyId(keys.server));
    }
  });

  it('is looked at in reading order', async () => {
    const { proofs } = await verifyBundle(text, sameReport);
    expect(proofs.map(({ subject }) => subject)).toEqual([
      'Form of the file',
      'List of source files',
      'Source file “run-force.yaml”',
      'Source file “basis.yaml”',
      'Digest of the report',
      'Report and manifest agree',
      'Signature 1, author',
      'Signature 2, checker',
      'Signature 3, approver',
      'Keys of the signers',
      'All three have signed',
      'Three different people',
      'Order of signing',
      'Key of the server',
      'Head of the log',
      'Log entry 1, “pushed”',
      'Log entry 3, “handed over”',
      'Log entry 5, “checked”',
      'Log entry 7, “approved”',
      'Story of the revision',
      'Log and signatures agree',
      'Times in the log',
      'Seal of the server',
      'No open holds',
      'Evaluated again',
    ]);
  });

  it('is the same text every time: nothing in it is random', async () => {
    expect(await sampleBundle(keys)).toBe(text);
    expect(text.endsWith('}\n')).toBe(true);
  });

  it('was returned once and handed over again', async () => {
    const deeds: Deed[] = [
      ['pushed', EMAILS.author, '07:00'],
      ['handed over', EMAILS.author, '07:10'],
      ['returned', EMAILS.checker, '07:20'],
      ...STORY.slice(1),
    ];
    expect(failures(await verifySealed(await withLog(deeds)))).toEqual([]);
  });
});

describe('the server key', () => {
  it('is named for comparison when the reader names none', async () => {
    const verification = await verifyBundle(text, sameReport);
    const kid = await keyId(keys.server);
    expect(detail(verification, 'Key of the server')).toBe(
      `as carried in the bundle: compare ${kid} with the one your team server publishes`,
    );
  });

  it('is accepted when it is the one that the reader trusts', async () => {
    expect((await verifyBundle(text, sameReport, { serverKey: await keyId(keys.server) })).valid).toBe(true);
  });

  it('unmasks a bundle that somebody has made up from end to end', async () => {
    const forger = await generateKeys();
    const forged = await sampleBundle(forger);
    expect((await verifyBundle(forged, sameReport)).valid).toBe(true);
    const verification = await verifyBundle(forged, sameReport, { serverKey: await keyId(keys.server) });
    expect(failures(verification)).toEqual(['Key of the server: not allowed']);
  });

  it('may not be carried under another id', async () => {
    const server = { ...(await publicKeyOf(keys.server)), kid: await keyId(keys.author) };
    const verification = await verifySealed({ keys: { ...parts.keys, server } });
    expect(failures(verification)).toContain('Key of the server: invalid');
  });
});

describe('the seal', () => {
  it('of another bundle is invalid', async () => {
    const other = JSON.parse(
      await sampleBundle(keys, await withLog(STORY, { time: '2026-03-02T13:00:00Z' })),
    ) as Bundle;
    const mixed = bundleText({ ...(JSON.parse(text) as Bundle), seal: other.seal });
    expect(failures(await verifyBundle(mixed, sameReport))).toEqual(['Seal of the server: invalid']);
  });

  it('by a person is not allowed', async () => {
    const forged = await sealBundle(parts, keys.author);
    expect(failures(await verifyBundle(forged, sameReport))).toEqual(['Seal of the server: not allowed']);
  });

  it('is not the head of a log', async () => {
    const mixed = bundleText({ ...(JSON.parse(text) as Bundle), seal: parts.log.head });
    expect(failures(await verifyBundle(mixed, sameReport))).toEqual(['Seal of the server: not allowed']);
  });
});

describe('the result', () => {
  const hold = { path: 'inputs/F', name: 'F', label: 'Force', reason: 'awaits the vendor' };

  it('with an open hold is not allowed', async () => {
    const report = { ...SAMPLE_REPORT, holds: [hold], summary: { ...SAMPLE_REPORT.summary, holds: 1 } };
    const verification = await verifyStudy(keys, report);
    expect(failures(verification)).toEqual(['No open holds: not allowed']);
    expect(detail(verification, 'No open holds')).toBe('1 hold is open: “F”');
  });

  it('that evaluates otherwise is invalid, with the difference', async () => {
    const quantity = SAMPLE_REPORT.quantities['F'];
    if (!quantity) throw new Error('the quantity is missing');
    const printed = { ...quantity.printed, number: '535' };
    const other: Report = { ...SAMPLE_REPORT, quantities: { F: { ...quantity, si: 2374.3, printed } } };
    const verification = await verifyBundle(text, () => ({ report: other, diagnostics: [] }));
    expect(failures(verification)).toEqual(['Evaluated again: invalid']);
    expect(detail(verification, 'Evaluated again')).toContain('“quantities/F” is recorded as “534 lbf');
  });

  it('that evaluates the same with a later core is accepted, with a note', async () => {
    const later = { ...SAMPLE_REPORT, core: '0.2.0' };
    const verification = await verifyBundle(text, () => ({ report: later, diagnostics: [] }));
    expect(failures(verification)).toEqual([]);
    expect(detail(verification, 'Evaluated again')).toContain(
      'core 0.2.0; note that the report was recorded by core “0.1.0”',
    );
  });

  it('that differs only in the last bits is accepted', async () => {
    const quantity = SAMPLE_REPORT.quantities['F'];
    if (!quantity) throw new Error('the quantity is missing');
    const other = { ...SAMPLE_REPORT, quantities: { F: { ...quantity, si: Number(quantity.si) * (1 + 5e-10) } } };
    expect((await verifyBundle(text, () => ({ report: other, diagnostics: [] }))).valid).toBe(true);
  });

  it('that does not evaluate is invalid', async () => {
    const verification = await verifyBundle(text, () => ({ report: null, diagnostics: [] }));
    expect(failures(verification)).toEqual(['Evaluated again: invalid']);
  });

  it('whose evaluation is stopped is invalid, and the other proofs still stand', async () => {
    const verification = await verifyBundle(text, () => Promise.reject(new Error('it ran too long')));
    expect(failures(verification)).toEqual(['Evaluated again: invalid']);
    expect(detail(verification, 'Evaluated again')).toBe('the evaluation was stopped: it ran too long');
  });

  it('is evaluated from the carried files, the sheet first', async () => {
    const calls: unknown[] = [];
    await verifyBundle(text, (files, entry) => {
      calls.push({ files, entry });
      return { report: SAMPLE_REPORT, diagnostics: [] };
    });
    expect(calls).toEqual([{ files: FILES, entry: 'run-force.yaml' }]);
  });
});

describe('where the platform cannot check signatures', () => {
  afterEach(() => vi.unstubAllGlobals());

  it('nothing is accepted, and the proofs say why', async () => {
    vi.stubGlobal('crypto', {});
    const verification = await verifyBundle(text, sameReport);
    expect(verification.valid).toBe(false);
    expect(detail(verification, 'Seal of the server')).toContain('could not be checked here');
    expect(failures(verification)).not.toContain('Source file “basis.yaml”: invalid');
  });
});
