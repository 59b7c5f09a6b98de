import { randomUUID } from 'node:crypto';
import { and, eq, inArray } from 'drizzle-orm';
import { emailKey } from '../../core/seal/prove-people.ts';
import type { Person } from '../../schemas/api.ts';
import { hashPassword } from '../auth/passwords.ts';
import { newRestingKey } from '../auth/signing-keys.ts';
import type { Database } from '../db/database.ts';
import { personKeys } from '../db/schema/keys.ts';
import { people } from '../db/schema/people.ts';
import type { Context } from './context.ts';

export interface NewPerson {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly isDemo: boolean;
}

/** Columns of a person that others may see. */
export const PERSON = { id: people.id, name: people.name, email: people.email } as const;

/** A new person with a signing key of their own. Throws when the address is taken. */
export async function createPerson(
  { db, now }: Context,
  { name, email, password, isDemo }: NewPerson,
): Promise<Person> {
  const [passwordHash, key] = await Promise.all([hashPassword(password), newRestingKey(password)]);
  const person = { id: randomUUID(), name, email };
  const created = now();
  await db.transaction(async (tx) => {
    await tx.insert(people).values({ ...person, emailKey: emailKey(email), passwordHash, isDemo, created });
    const { kid, x } = key.publicKey;
    await tx.insert(personKeys).values({ kid, personId: person.id, x, salt: key.salt, sealed: key.sealed, created });
  });
  return person;
}

/** People of the demo study count only on a demo server, however they come in. */
export function mayAct(isDemoServer: boolean) {
  return isDemoServer ? undefined : eq(people.isDemo, false);
}

export async function peopleById(db: Database, ids: readonly string[]): Promise<ReadonlyMap<string, Person>> {
  if (ids.length === 0) return new Map();
  const rows = await db
    .select(PERSON)
    .from(people)
    .where(inArray(people.id, [...new Set(ids)]));
  return new Map(rows.map((row) => [row.id, row]));
}

/** A person that a row refers to: there, by the rules of the database. */
export function personOf(known: ReadonlyMap<string, Person>, id: string): Person {
  const person = known.get(id);
  if (!person) throw new Error(`person ${id} was not loaded`);
  return person;
}

export async function findForSignIn({ db, isDemo }: Context, email: string) {
  const [row] = await db
    .select({ ...PERSON, passwordHash: people.passwordHash })
    .from(people)
    .where(and(eq(people.emailKey, emailKey(email)), mayAct(isDemo)));
  return row;
}
