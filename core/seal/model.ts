import type { Report } from '../report/model.ts';

/** What people sign: everything that makes a revision what it is. Signed as RFC 8785 canonical JSON. */
export interface Manifest {
  readonly antinode: 'manifest/1';
  readonly study: string;
  readonly number: string;
  readonly revision: string;
  /** Digest of the UTF-8 bytes of each source file, the sheet first. */
  readonly sources: readonly { readonly name: string; readonly digest: string }[];
  /** Digests of the manifests of revisions that values are taken from. */
  readonly taken: readonly { readonly number: string; readonly revision: string; readonly digest: string }[];
  /** Digest of the canonical JSON of the report. */
  readonly report: string;
  readonly core: string;
  readonly checks: { readonly passed: number; readonly failed: number };
  readonly holds: number;
  /** Digest of the manifest of the revision before this one; null for the first. */
  readonly previous: string | null;
}

export type SignatureRole = 'author' | 'checker' | 'approver';

/** Claims of one signature: the JWS payload, canonical JSON. */
export interface SignatureClaims {
  readonly antinode: 'signature/1';
  readonly manifest: string;
  readonly role: SignatureRole;
  /** What the signature means, in words. */
  readonly meaning: string;
  readonly name: string;
  readonly email: string;
  /** ISO 8601, UTC. */
  readonly time: string;
}

/** Public part of a signing key (RFC 8037), its id being its RFC 7638 thumbprint. */
export interface PublicKey {
  readonly kty: 'OKP';
  readonly crv: 'Ed25519';
  readonly x: string;
  readonly kid: string;
}

/** Private half of a signing key as a JWK. It comes from outside and stays there: this folder makes and stores none. */
export interface SigningKey {
  readonly kty: 'OKP';
  readonly crv: 'Ed25519';
  readonly x: string;
  readonly d: string;
}

/** The `typ` in the protected header of each kind of signed record, so that none can pass as another. */
export type RecordType = 'antinode-signature+jws' | 'antinode-log-head+jws' | 'antinode-seal+jws';

/** One event of a revision's life; its canonical JSON is a leaf of the server's log. */
export interface LogEvent {
  readonly index: number;
  readonly event: string;
  readonly study: string;
  readonly number: string;
  readonly revision: string;
  readonly manifest: string;
  readonly actor: string;
  readonly time: string;
  readonly note: string;
}

/** Head of the append-only log, signed by the server as a compact JWS over its canonical JSON. */
export interface LogHead {
  readonly antinode: 'log-head/1';
  readonly size: number;
  /** RFC 9162 Merkle tree hash, hexadecimal. */
  readonly root: string;
  readonly time: string;
}

/** What the server signs when it closes a bundle: the JWS payload, canonical JSON. */
export interface SealClaims {
  readonly antinode: 'seal/1';
  /** Digest of the canonical JSON of the bundle without its seal. */
  readonly bundle: string;
}

/** A source file as bundles carry it. */
export interface SourceFile {
  readonly name: string;
  readonly text: string;
}

/** One file that holds all it takes to verify a revision offline. Written as canonical JSON and one line feed. */
export interface Bundle {
  readonly antinode: 'bundle/1';
  readonly manifest: Manifest;
  readonly files: readonly SourceFile[];
  readonly report: Report;
  /** Compact JWS (RFC 7515, EdDSA), one per signer. */
  readonly signatures: readonly string[];
  readonly keys: { readonly people: readonly PublicKey[]; readonly server: PublicKey };
  readonly log: {
    readonly head: string;
    readonly entries: readonly { readonly event: LogEvent; readonly proof: readonly string[] }[];
  };
  /** Compact JWS of the server over the digest of the bundle without this field. */
  readonly seal: string;
}

/** One thing that verification looked at. `invalid`: the mathematics fails; `not allowed`: valid, but against the rules. */
export interface Proof {
  readonly subject: string;
  readonly holds: boolean;
  readonly fault?: 'invalid' | 'not allowed';
  /** What the proof shows, or why it fails. May quote the bundle: a terminal must be shown it with control characters made visible. */
  readonly detail: string;
}

/** What came of verifying a bundle. Nothing but `proofs` may be relied on unless `valid`. */
export interface Verification {
  readonly valid: boolean;
  /** In reading order. */
  readonly proofs: readonly Proof[];
  /** As carried in the bundle; absent where the bundle can't be read. */
  readonly manifest?: Manifest;
  /** Those whose signature is good. */
  readonly signers: readonly (SignatureClaims & { readonly kid: string })[];
  /** Id of the server key that the bundle carries. */
  readonly serverKey?: string;
}
