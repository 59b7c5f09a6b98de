import { randomUUID } from 'node:crypto';
import { and, asc, eq } from 'drizzle-orm';
import type { SignatureClaims, SigningKey } from '../../core/seal/model.ts';
import { signClaims } from '../../core/seal/sign.ts';
import { publicKeyOf } from '../../core/seal/keys.ts';
import type { Person, Signature } from '../../schemas/api.ts';
import { wakeKey } from '../auth/signing-keys.ts';
import type { Database } from '../db/database.ts';
import { personKeys } from '../db/schema/keys.ts';
import { signatures } from '../db/schema/signatures.ts';

/** Opens the person's signing key with their password, which has been checked before. */
export async function openSigningKey(db: Database, person: Person, password: string): Promise<SigningKey> {
  const [row] = await db.select().from(personKeys).where(eq(personKeys.personId, person.id));
  if (!row) throw new Error(`person ${person.id} has no signing key`);
  const { kid, x, salt, sealed } = row;
  return wakeKey({ publicKey: { kty: 'OKP', crv: 'Ed25519', x, kid }, salt, sealed }, password);
}

export interface NewSignature {
  readonly revision: { readonly id: string; readonly manifestDigest: string };
  readonly role: SignatureClaims['role'];
  readonly meaning: string;
  readonly person: Person;
  readonly key: SigningKey;
  readonly time: Date;
}

export async function addSignature(tx: Database, signature: NewSignature): Promise<void> {
  const { revision, role, meaning, person, key, time } = signature;
  const { name, email } = person;
  const claims: SignatureClaims = {
    antinode: 'signature/1',
    manifest: revision.manifestDigest,
    role,
    meaning,
    name,
    email,
    time: time.toISOString(),
  };
  const [jws, { kid }] = await Promise.all([signClaims(claims, key), publicKeyOf(key)]);
  await tx.insert(signatures).values({
    id: randomUUID(),
    revisionId: revision.id,
    role,
    personId: person.id,
    kid,
    name,
    email,
    meaning,
    time,
    jws,
  });
}

export type SignatureRow = typeof signatures.$inferSelect & { readonly x: string };

const SIGNING_ORDER: readonly SignatureRow['role'][] = ['author', 'checker', 'approver'];

/**
 * The signatures that stand on a revision, in the order of signing: the last one of each role. A revision that was returned
 * and handed over again has earlier ones; they stay in the database, and stand no more once the author has signed again.
 */
export async function standingSignatures(db: Database, revisionId: string): Promise<SignatureRow[]> {
  const rows = await db
    .select({ signature: signatures, x: personKeys.x })
    .from(signatures)
    .innerJoin(personKeys, eq(personKeys.kid, signatures.kid))
    .where(eq(signatures.revisionId, revisionId))
    .orderBy(asc(signatures.time));
  const all = rows.map(({ signature, x }) => ({ ...signature, x }));
  const author = all.findLast(({ role }) => role === 'author');
  return SIGNING_ORDER.flatMap((role) => {
    const last = all.findLast((row) => row.role === role);
    return last === undefined || (author !== undefined && last.time < author.time) ? [] : [last];
  });
}

/** Whether the person has ever signed the revision as its checker: also one whose check was returned does not approve. */
export async function hasChecked(db: Database, revisionId: string, personId: string): Promise<boolean> {
  const own = and(
    eq(signatures.revisionId, revisionId),
    eq(signatures.personId, personId),
    eq(signatures.role, 'checker'),
  );
  const rows = await db.select({ id: signatures.id }).from(signatures).where(own).limit(1);
  return rows.length > 0;
}

export function toSignature({ role, name, email, time, meaning, kid }: SignatureRow): Signature {
  return { role, name, email, time: time.toISOString(), meaning, kid };
}
