import { and, eq, gt, lte } from 'drizzle-orm';
import type { Person, SignIn } from '../../schemas/api.ts';
import { hashSecret, newSecret } from '../auth/secrets.ts';
import { people } from '../db/schema/people.ts';
import { sessions } from '../db/schema/sessions.ts';
import type { Context } from './context.ts';
import { mayAct, PERSON } from './people.ts';
import { checkPassword } from './sign-in.ts';

/** A session ends when it has not been used for so long. */
export const IDLE_MS = 12 * 60 * 60 * 1000;
/** Use is written down at most so often. */
const TOUCH_MS = 60 * 1000;

export interface OpenSession {
  readonly person: Person;
  readonly csrf: string;
  readonly secretHash: string;
}

/** `secret` goes into the cookie and nowhere else. */
export async function signIn(context: Context, { email, password }: SignIn): Promise<OpenSession & { secret: string }> {
  const person = await checkPassword(context, email, password);
  const { db, now } = context;
  const time = now();
  const secret = newSecret();
  const session = { secretHash: hashSecret(secret), csrf: newSecret() };
  await db.delete(sessions).where(lte(sessions.lastSeen, new Date(time.getTime() - IDLE_MS)));
  await db.insert(sessions).values({ ...session, personId: person.id, created: time, lastSeen: time });
  return { person, ...session, secret };
}

export async function openSession({ db, now, isDemo }: Context, secret: string): Promise<OpenSession | null> {
  const time = now();
  const secretHash = hashSecret(secret);
  const [row] = await db
    .select({ person: PERSON, csrf: sessions.csrf, lastSeen: sessions.lastSeen })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .where(
      and(
        eq(sessions.secretHash, secretHash),
        gt(sessions.lastSeen, new Date(time.getTime() - IDLE_MS)),
        mayAct(isDemo),
      ),
    );
  if (!row) return null;
  if (time.getTime() - row.lastSeen.getTime() > TOUCH_MS) {
    await db.update(sessions).set({ lastSeen: time }).where(eq(sessions.secretHash, secretHash));
  }
  return { person: row.person, csrf: row.csrf, secretHash };
}

export async function endSession({ db }: Context, secretHash: string): Promise<void> {
  await db.delete(sessions).where(eq(sessions.secretHash, secretHash));
}
