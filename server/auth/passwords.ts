import { hash, hashRaw, verify } from '@node-rs/argon2';

/** Argon2id (RFC 9106) with 19 MiB and two passes, all of which are the defaults of the library, and stated here to stay. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

const KEY_BYTES = 32;

/** Any hash will do: the time of checking against it is what a missing account must take as well. */
let decoy: Promise<string> | undefined;

/** One password may be typed in several ways on different keyboards; NFKC makes them one. */
function normal(password: string): string {
  return password.normalize('NFKC');
}

export function hashPassword(password: string): Promise<string> {
  return hash(normal(password), COST);
}

/** Without a hash the answer is no, and takes as long. */
export async function isPassword(password: string, passwordHash: string | undefined): Promise<boolean> {
  if (passwordHash !== undefined) return verify(passwordHash, normal(password));
  decoy ??= hashPassword('no account has this password');
  await verify(await decoy, normal(password));
  return false;
}

/** Key under which a person's signing key rests. Its salt is its own, so that the stored hash says nothing of it. */
export function keyFromPassword(password: string, salt: Uint8Array): Promise<Buffer> {
  return hashRaw(normal(password), { ...COST, salt, outputLen: KEY_BYTES });
}
