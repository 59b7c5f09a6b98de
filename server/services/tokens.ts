import { randomUUID } from 'node:crypto';
import { and, asc, eq } from 'drizzle-orm';
import type { AccessToken, CreatedToken, Person } from '../../schemas/api.ts';
import { hashSecret, newSecret } from '../auth/secrets.ts';
import type { Database } from '../db/database.ts';
import { people } from '../db/schema/people.ts';
import { accessTokens } from '../db/schema/tokens.ts';
import { notFound } from '../problem.ts';
import type { Context } from './context.ts';
import { mayAct, PERSON } from './people.ts';

const PREFIX = 'antn_';
const TOUCH_MS = 60 * 1000;

export interface KnownToken {
  readonly person: Person;
  readonly tokenId: string;
}

export async function listTokens({ db }: Context, person: Person): Promise<AccessToken[]> {
  const rows = await db
    .select()
    .from(accessTokens)
    .where(eq(accessTokens.personId, person.id))
    .orderBy(asc(accessTokens.created));
  return rows.map(toToken);
}

export async function createToken(db: Database, personId: string, label: string, created: Date): Promise<CreatedToken> {
  const token = PREFIX + newSecret();
  const row = { id: randomUUID(), personId, label, secretHash: hashSecret(token), created, lastUsed: null };
  await db.insert(accessTokens).values(row);
  return { ...toToken(row), token };
}

export async function revokeToken({ db }: Context, person: Person, id: string): Promise<void> {
  const mine = and(eq(accessTokens.id, id), eq(accessTokens.personId, person.id));
  const gone = await db.delete(accessTokens).where(mine).returning({ id: accessTokens.id });
  if (gone.length === 0) throw notFound('such token');
}

export async function findToken({ db, now, isDemo }: Context, token: string): Promise<KnownToken | null> {
  if (!token.startsWith(PREFIX)) return null;
  const [row] = await db
    .select({ person: PERSON, tokenId: accessTokens.id, lastUsed: accessTokens.lastUsed })
    .from(accessTokens)
    .innerJoin(people, eq(people.id, accessTokens.personId))
    .where(and(eq(accessTokens.secretHash, hashSecret(token)), mayAct(isDemo)));
  if (!row) return null;
  const time = now();
  if (time.getTime() - (row.lastUsed?.getTime() ?? 0) > TOUCH_MS) {
    await db.update(accessTokens).set({ lastUsed: time }).where(eq(accessTokens.id, row.tokenId));
  }
  return { person: row.person, tokenId: row.tokenId };
}

type TokenRow = Pick<typeof accessTokens.$inferSelect, 'id' | 'label' | 'created' | 'lastUsed'>;

function toToken({ id, label, created, lastUsed }: TokenRow): AccessToken {
  return { id, label, created: created.toISOString(), lastUsed: lastUsed?.toISOString() ?? null };
}
