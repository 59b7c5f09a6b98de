import { createHash, randomBytes, randomInt, timingSafeEqual } from 'node:crypto';

/** A secret of 256 random bits, base64url. */
export function newSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** What is stored of a secret. A plain hash is enough: 256 random bits can't be guessed. */
export function hashSecret(secret: string): string {
  return createHash('sha256').update(secret, 'utf8').digest('base64url');
}

/** Takes the same time wherever the two differ. */
export function sameSecret(a: string, b: string): boolean {
  const [left, right] = [Buffer.from(a, 'utf8'), Buffer.from(b, 'utf8')];
  return left.length === right.length && timingSafeEqual(left, right);
}

/** Letters that are not taken for one another, and spell no words. */
const USER_CODE_LETTERS = 'BCDFGHJKLMNPQRSTVWXZ';

/** What a person compares between terminal and browser: `BCDF-GHJK`. */
export function newUserCode(): string {
  const letters = Array.from({ length: 8 }, () => USER_CODE_LETTERS.charAt(randomInt(USER_CODE_LETTERS.length)));
  return `${letters.slice(0, 4).join('')}-${letters.slice(4).join('')}`;
}
