import { eq, lt } from 'drizzle-orm';
import { emailKey } from '../../core/seal/prove-people.ts';
import type { Person } from '../../schemas/api.ts';
import { isPassword } from '../auth/passwords.ts';
import { hashSecret } from '../auth/secrets.ts';
import { signInFailures } from '../db/schema/people.ts';
import { Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { findForSignIn } from './people.ts';

/** From this failure on the account rests: 30 s, then twice as long each time, at most 15 min. */
const FREE_FAILURES = 5;
const FIRST_REST_S = 30;
const LONGEST_REST_S = 15 * 60;
/** Failures are forgotten after a day. */
const MEMORY_MS = 24 * 60 * 60 * 1000;

/**
 * Checks a password, at sign-in and again for each signature. An address without an account is answered in the same words
 * and the same time as a wrong password, and rests after as many failures.
 */
export async function checkPassword(context: Context, email: string, password: string, status = 401): Promise<Person> {
  const account = hashSecret(emailKey(email));
  await countAttempt(context, account);
  const found = await findForSignIn(context, email);
  if (!(await isPassword(password, found?.passwordHash)) || !found) {
    throw new Refusal('wrong-password', 'the e-mail or the password is wrong', { status });
  }
  await context.db.delete(signInFailures).where(eq(signInFailures.accountHash, account));
  const { id, name, email: address } = found;
  return { id, name, email: address };
}

/** Counted as failed before it is checked, and forgiven afterwards: many at once get no more guesses than one by one. */
async function countAttempt({ db, now }: Context, accountHash: string): Promise<void> {
  const time = now();
  await db.transaction(async (tx) => {
    await tx.delete(signInFailures).where(lt(signInFailures.lastFailure, new Date(time.getTime() - MEMORY_MS)));
    await tx.insert(signInFailures).values({ accountHash, failures: 0, lastFailure: time }).onConflictDoNothing();
    const [row] = await tx
      .select()
      .from(signInFailures)
      .where(eq(signInFailures.accountHash, accountHash))
      .for('update');
    const wait = ((row?.lockedUntil?.getTime() ?? 0) - time.getTime()) / 1000;
    if (wait > 0) throw lockedOut(Math.ceil(wait));
    const failures = (row?.failures ?? 0) + 1;
    const lockedUntil = failures < FREE_FAILURES ? null : new Date(time.getTime() + restSeconds(failures) * 1000);
    await tx
      .update(signInFailures)
      .set({ failures, lockedUntil, lastFailure: time })
      .where(eq(signInFailures.accountHash, accountHash));
  });
}

function restSeconds(failures: number): number {
  return Math.min(LONGEST_REST_S, FIRST_REST_S * 2 ** (failures - FREE_FAILURES));
}

function lockedOut(seconds: number): Refusal {
  return new Refusal('locked-out', `too many failed attempts; try again in ${seconds} s`, { retryAfter: seconds });
}
