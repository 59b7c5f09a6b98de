import type { Report } from '../../../core/report/model.ts';
import { buildManifest } from '../../../core/seal/manifest.ts';
import type { Verification } from '../../../core/seal/model.ts';
import { sealBundle, type BundleParts } from '../../../core/seal/seal-bundle.ts';
import { verifyBundle, type VerifyOptions } from '../../../core/seal/verify-bundle.ts';
import {
  FILES,
  eventsOf,
  generateKeys,
  logOf,
  sameReport,
  sampleBundle,
  sampleParts,
  type Deed,
  type Keys,
  type LogOptions,
} from './sample-bundle.ts';

export interface Sample {
  readonly keys: Keys;
  readonly parts: BundleParts;
  readonly text: string;
  /** The log of another life than the sample's. */
  readonly withLog: (deeds: readonly Deed[], options?: LogOptions) => Promise<Pick<BundleParts, 'log'>>;
  /** Seals altered parts with the server's good key, and verifies: only the rule that is broken may object. */
  readonly verifySealed: (changes: Partial<BundleParts>, options?: VerifyOptions) => Promise<Verification>;
}

export async function makeSample(): Promise<Sample> {
  const keys = await generateKeys();
  const parts = await sampleParts(keys);
  return {
    keys,
    parts,
    text: await sampleBundle(keys),
    withLog: async (deeds, options) => ({ log: await logOf(eventsOf(parts.manifest, deeds), keys.server, options) }),
    verifySealed: async (changes, options) =>
      verifyBundle(await sealBundle({ ...parts, ...changes }, keys.server), sameReport, options),
  };
}

/** Subjects and kinds of the proofs that fail. */
export function failures({ proofs }: Verification): string[] {
  return proofs.flatMap(({ subject, holds, fault }) => (holds ? [] : [`${subject}: ${fault}`]));
}

export function detail({ proofs }: Verification, subject: string): string {
  return proofs.find((proof) => proof.subject === subject)?.detail ?? `no proof of ${subject}`;
}

/** A whole new revision with this report and these files, signed and sealed in order. */
export async function verifyStudy(keys: Keys, report: Report, files = FILES): Promise<Verification> {
  const manifest = buildManifest({ study: 'th-3', revision: 'B', files, report, taken: [], previous: null });
  const altered = { ...(await sampleParts(keys, manifest)), report, files };
  return verifyBundle(await sealBundle(altered, keys.server), () => ({ report, diagnostics: [] }));
}
