/** Builds real bundles from parts that a test may alter before they are signed and sealed. */
import { exportJWK, generateKeyPair } from 'jose';
import { digestJson } from '../../../core/seal/digest.ts';
import { publicKeyOf } from '../../../core/seal/keys.ts';
import { logLeaf } from '../../../core/seal/log-leaf.ts';
import { buildManifest } from '../../../core/seal/manifest.ts';
import { inclusionProof, leafHash, treeRoot } from '../../../core/seal/merkle.ts';
import type { LogEvent, Manifest, SignatureClaims, SignatureRole, SigningKey } from '../../../core/seal/model.ts';
import type { Evaluate } from '../../../core/seal/prove-result.ts';
import { sealBundle, type BundleParts } from '../../../core/seal/seal-bundle.ts';
import { signClaims, signLogHead } from '../../../core/seal/sign.ts';
import { SAMPLE_REPORT } from './sample-report.ts';

export type Keys = Readonly<Record<SignatureRole | 'server', SigningKey>>;

export const EMAILS = {
  author: 'ines@tarn.example',
  checker: 'marek@tarn.example',
  approver: 'ruth@tarn.example',
} as const;

export const FILES = [
  { name: 'run-force.yaml', text: 'antinode: sheet/1\nnumber: TH3-C-104\nuse: [basis.yaml]\n' },
  { name: 'basis.yaml', text: 'inputs:\n  F: { value: 533.75 lbf, label: "Force – Ω" }\n' },
];

/** Stands for the evaluator, which has tests of its own: gives the recorded report. */
export const sameReport: Evaluate = () => ({ report: SAMPLE_REPORT, diagnostics: [] });

export async function generateKey(): Promise<SigningKey> {
  const { privateKey } = await generateKeyPair('EdDSA', { crv: 'Ed25519', extractable: true });
  const { x, d } = await exportJWK(privateKey);
  if (x === undefined || d === undefined) throw new Error('the key has no members');
  return { kty: 'OKP', crv: 'Ed25519', x, d };
}

export async function generateKeys(): Promise<Keys> {
  const [author, checker, approver, server] = await Promise.all([
    generateKey(),
    generateKey(),
    generateKey(),
    generateKey(),
  ]);
  return { author, checker, approver, server };
}

export function sampleManifest(changes: Partial<Manifest> = {}): Manifest {
  const parts = { study: 'th-3', revision: 'B', files: FILES, report: SAMPLE_REPORT, taken: [], previous: null };
  return { ...buildManifest(parts), ...changes };
}

const HOURS: Readonly<Record<SignatureRole, string>> = { author: '09', checker: '10', approver: '11' };

export function claimsOf(role: SignatureRole, manifest: Manifest): SignatureClaims {
  return {
    antinode: 'signature/1',
    manifest: digestJson(manifest),
    role,
    meaning: `I am the ${role}`,
    name: `The ${role}`,
    email: EMAILS[role],
    time: `2026-03-02T${HOURS[role]}:00:00.000Z`,
  };
}

/** An event of the sample's life: who did what, and when (hours and minutes). */
export type Deed = readonly [event: string, actor: string, clock: string];

export const STORY: readonly Deed[] = [
  ['pushed', EMAILS.author, '08:00'],
  ['handed over', EMAILS.author, '09:00'],
  ['checked', EMAILS.checker, '10:00'],
  ['approved', EMAILS.approver, '11:00'],
];

export function eventsOf(manifest: Manifest, deeds: readonly Deed[] = STORY): LogEvent[] {
  const { study, number, revision } = manifest;
  const digest = digestJson(manifest);
  return deeds.map(([event, actor, clock], order) => {
    const time = `2026-03-02T${clock}:00.000Z`;
    // Every second leaf belongs to another revision, as in a log that a whole team writes to.
    return { index: 2 * order + 1, event, study, number, revision, manifest: digest, actor, time, note: '' };
  });
}

export interface LogOptions {
  readonly time?: string;
  /** Leaves of other revisions; a different text makes a different tree. */
  readonly others?: string;
}

export async function logOf(
  events: readonly LogEvent[],
  server: SigningKey,
  { time = '2026-03-02T12:00:00.000Z', others = 'another event' }: LogOptions = {},
): Promise<BundleParts['log']> {
  const size = 2 * events.length + 1;
  const leaves = Array.from({ length: size }, (_, index) => {
    const event = events.find((candidate) => candidate.index === index);
    return event ? logLeaf(event) : leafHash(`${others} ${index}`);
  });
  const head = await signLogHead({ antinode: 'log-head/1', size, root: treeRoot(leaves), time }, server);
  const entries = events.map((event) => ({ event, proof: inclusionProof(leaves, Math.min(event.index, size - 1)) }));
  return { head, entries };
}

export async function signAll(manifest: Manifest, keys: Keys): Promise<string[]> {
  const roles = ['author', 'checker', 'approver'] as const;
  return Promise.all(roles.map((role) => signClaims(claimsOf(role, manifest), keys[role])));
}

export async function sampleParts(keys: Keys, manifest = sampleManifest()): Promise<BundleParts> {
  return {
    manifest,
    files: FILES,
    report: SAMPLE_REPORT,
    signatures: await signAll(manifest, keys),
    keys: {
      people: await Promise.all([keys.author, keys.checker, keys.approver].map((key) => publicKeyOf(key))),
      server: await publicKeyOf(keys.server),
    },
    log: await logOf(eventsOf(manifest), keys.server),
  };
}

export async function sampleBundle(keys: Keys, changes: Partial<BundleParts> = {}): Promise<string> {
  return sealBundle({ ...(await sampleParts(keys)), ...changes }, keys.server);
}
