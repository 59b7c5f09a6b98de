import { and, eq, lt } from 'drizzle-orm';
import type { DeviceGrant, DeviceInquiry, DeviceToken, OAuthError, Person } from '../../schemas/api.ts';
import { hashSecret, newSecret, newUserCode } from '../auth/secrets.ts';
import type { Database } from '../db/database.ts';
import { deviceGrants } from '../db/schema/device-grants.ts';
import { notFound, Refusal } from '../problem.ts';
import type { Context } from './context.ts';
import { peopleById, personOf } from './people.ts';
import { createToken } from './tokens.ts';

const LIFE_S = 10 * 60;
const INTERVAL_S = 5;
/** Added for good when a client polls too soon (RFC 8628 section 3.5). */
const SLOW_DOWN_S = 5;
/** Expired grants are kept for a while, so that a late answer says `expired` and not that there never was one. */
const KEPT_MS = 60 * 60 * 1000;

type Grant = typeof deviceGrants.$inferSelect;

export async function authorizeDevice({ db, now, address }: Context, client: string): Promise<DeviceGrant> {
  const requested = now();
  const [deviceCode, userCode] = [newSecret(), newUserCode()];
  await db.delete(deviceGrants).where(lt(deviceGrants.expires, new Date(requested.getTime() - KEPT_MS)));
  await db.insert(deviceGrants).values({
    deviceCodeHash: hashSecret(deviceCode),
    userCode,
    client,
    state: 'waiting',
    requested,
    expires: new Date(requested.getTime() + LIFE_S * 1000),
    interval: INTERVAL_S,
  });
  const page = `${address()}/device`;
  return {
    device_code: deviceCode,
    user_code: userCode,
    verification_uri: page,
    verification_uri_complete: `${page}?code=${userCode}`,
    expires_in: LIFE_S,
    interval: INTERVAL_S,
  };
}

/** One poll of the client. An approval is handed out once: the grant is gone with it. */
export async function pollDevice({ db, now }: Context, deviceCode: string): Promise<DeviceToken | OAuthError> {
  const time = now();
  return db.transaction(async (tx) => {
    const mine = eq(deviceGrants.deviceCodeHash, hashSecret(deviceCode));
    const [grant] = await tx.select().from(deviceGrants).where(mine).for('update');
    if (!grant) return { error: 'invalid_grant' };
    if (grant.expires <= time) return { error: 'expired_token' };
    if (isTooSoon(grant, time)) {
      await tx
        .update(deviceGrants)
        .set({ lastPolled: time, interval: grant.interval + SLOW_DOWN_S })
        .where(mine);
      return { error: 'slow_down' };
    }
    if (grant.state === 'waiting') {
      await tx.update(deviceGrants).set({ lastPolled: time }).where(mine);
      return { error: 'authorization_pending' };
    }
    await tx.delete(deviceGrants).where(mine);
    if (grant.state === 'refused' || grant.personId === null) return { error: 'access_denied' };
    return grantToken(tx, grant.personId, grant.client, time);
  });
}

async function grantToken(tx: Database, personId: string, client: string, time: Date): Promise<DeviceToken> {
  const { token } = await createToken(tx, personId, client, time);
  const person = personOf(await peopleById(tx, [personId]), personId);
  return { access_token: token, token_type: 'Bearer', person };
}

function isTooSoon({ lastPolled, interval }: Grant, time: Date): boolean {
  return lastPolled !== null && time.getTime() - lastPolled.getTime() < interval * 1000;
}

export async function inquireDevice({ db, now }: Context, userCode: string): Promise<DeviceInquiry> {
  const [grant] = await db.select().from(deviceGrants).where(eq(deviceGrants.userCode, userCode));
  if (!grant) throw notFound('request with this code');
  return {
    client: grant.client,
    requested: grant.requested.toISOString(),
    state: grant.state === 'waiting' && grant.expires <= now() ? 'expired' : grant.state,
  };
}

export async function decideDevice(
  context: Context,
  person: Person,
  userCode: string,
  approve: boolean,
): Promise<void> {
  const { state } = await inquireDevice(context, userCode);
  if (state !== 'waiting') throw alreadyDecided(state);
  // Of two decisions at once the first stands.
  const decided = await context.db
    .update(deviceGrants)
    .set(approve ? { state: 'approved', personId: person.id } : { state: 'refused' })
    .where(and(eq(deviceGrants.userCode, userCode), eq(deviceGrants.state, 'waiting')))
    .returning({ userCode: deviceGrants.userCode });
  if (decided.length === 0) throw alreadyDecided('decided');
}

function alreadyDecided(state: string): Refusal {
  return new Refusal('wrong-state', `the request with this code is already ${state}`);
}
