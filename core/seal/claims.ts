/** The shape of what signed records say. A good signature does not make its payload well formed: the signer may be hostile. */
import type { LogHead, SealClaims, SignatureClaims } from './model.ts';

type Guard = (value: unknown) => boolean;
type Shape<T> = { readonly [K in keyof T]: Guard };

const ROLES: readonly unknown[] = ['author', 'checker', 'approver'] satisfies SignatureClaims['role'][];

const SIGNATURE: Shape<SignatureClaims> = {
  antinode: (value) => value === 'signature/1',
  manifest: isDigest,
  role: (value) => ROLES.includes(value),
  meaning: isText,
  name: isText,
  email: isText,
  time: isTime,
};

const LOG_HEAD: Shape<LogHead> = {
  antinode: (value) => value === 'log-head/1',
  size: (value) => Number.isSafeInteger(value) && Number(value) >= 0,
  root: (value) => typeof value === 'string' && /^[0-9a-f]{64}$/.test(value),
  time: isTime,
};

const SEAL: Shape<SealClaims> = { antinode: (value) => value === 'seal/1', bundle: isDigest };

export function isSignatureClaims(value: unknown): value is SignatureClaims {
  return fits(value, SIGNATURE);
}

export function isLogHead(value: unknown): value is LogHead {
  return fits(value, LOG_HEAD);
}

export function isSealClaims(value: unknown): value is SealClaims {
  return fits(value, SEAL);
}

/**
 * A time that can be compared as text: `2026-03-02T09:30:00.000Z`. Milliseconds may be left out; null for all other
 * forms. Parsing by the platform is avoided, since engines differ on what else they accept.
 */
export function sortableTime(text: string): string | null {
  const match = /^(\d{4}-(?:0[1-9]|1[0-2])-(?:0[1-9]|[12]\d|3[01])T(?:[01]\d|2[0-3])(?::[0-5]\d){2})(\.\d{3})?Z$/.exec(
    text,
  );
  return match?.[1] === undefined ? null : `${match[1]}${match[2] ?? '.000'}Z`;
}

/** Exactly the members of the shape, each passing its guard. */
function fits<T>(value: unknown, shape: Shape<T>): value is T {
  if (typeof value !== 'object' || value === null) return false;
  const members = new Map<string, unknown>(Object.entries(value));
  const guards = Object.entries<Guard>(shape);
  return (
    members.size === guards.length && guards.every(([name, guard]) => members.has(name) && guard(members.get(name)))
  );
}

function isText(value: unknown): boolean {
  return typeof value === 'string' && value.trim() !== '';
}

function isTime(value: unknown): boolean {
  return typeof value === 'string' && sortableTime(value) !== null;
}

function isDigest(value: unknown): boolean {
  return typeof value === 'string' && /^sha256-[0-9a-f]{64}$/.test(value);
}
