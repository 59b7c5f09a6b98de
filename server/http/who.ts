import type { Request, RequestHandler, Response } from 'express';
import type { Person } from '../../schemas/api.ts';
import { sameSecret } from '../auth/secrets.ts';
import { Refusal } from '../problem.ts';
import type { Context } from '../services/context.ts';
import { openSession, type OpenSession } from '../services/sessions.ts';
import { findToken } from '../services/tokens.ts';
import { readSessionCookie } from './cookies.ts';

/** Who makes a request: a person in a browser, a person's token, or nobody. */
export type Caller =
  | { readonly by: 'session'; readonly person: Person; readonly session: OpenSession }
  | { readonly by: 'token'; readonly person: Person; readonly tokenId: string }
  | { readonly by: 'nobody' };

const NOBODY: Caller = { by: 'nobody' };

/** Finds out who makes the request, once, before any route. */
export function identify(context: Context): RequestHandler {
  return async (request, response, next) => {
    response.locals['caller'] = await callerOf(context, request);
    next();
  };
}

async function callerOf(context: Context, request: Request): Promise<Caller> {
  const token = bearerToken(request);
  if (token !== undefined) {
    const known = await findToken(context, token);
    if (!known) throw new Refusal('not-signed-in', 'the token is not valid; sign in again');
    return { by: 'token', ...known };
  }
  const secret = readSessionCookie(request);
  const session = secret === undefined ? null : await openSession(context, secret);
  return session === null ? NOBODY : { by: 'session', person: session.person, session };
}

function bearerToken(request: Request): string | undefined {
  return /^Bearer\s+(\S+)$/i.exec(request.get('authorization') ?? '')?.[1];
}

export function callerIn(response: Response): Caller {
  return response.locals['caller'] as Caller;
}

/** The person who makes the request, or a refusal. */
export function personIn(response: Response): Person {
  const caller = callerIn(response);
  if (caller.by === 'nobody') throw new Refusal('not-signed-in', 'sign in first');
  return caller.person;
}

/** The person in front of a browser: what grants or signs is not for tokens. */
export function personInBrowser(response: Response): Person {
  const caller = callerIn(response);
  if (caller.by === 'token') throw new Refusal('needs-browser', 'sign in in the browser for this');
  return personIn(response);
}

const SAFE_METHODS: readonly string[] = ['GET', 'HEAD', 'OPTIONS'];

/**
 * A page of another site can make a browser send the cookie, but can read no answer: so every change must carry the
 * session's own value in a header. Tokens are not sent by themselves, and need none. The origin, where a browser states
 * one, must be ours, which also keeps other sites from signing people in.
 */
export function refuseForgery(context: Context): RequestHandler {
  return (request, response, next) => {
    const caller = callerIn(response);
    if (SAFE_METHODS.includes(request.method) || caller.by === 'token') {
      next();
      return;
    }
    if (!isOwnOrigin(request, context)) throw new Refusal('csrf', 'the request comes from another site');
    if (caller.by === 'session' && !sameSecret(request.get('x-csrf-token') ?? '', caller.session.csrf)) {
      throw new Refusal('csrf', 'the page is out of date; load it again');
    }
    next();
  };
}

function isOwnOrigin(request: Request, { address }: Context): boolean {
  const origin = request.get('origin');
  if (origin === undefined) return true;
  return origin === address() || (URL.canParse(origin) && new URL(origin).host === request.get('host'));
}
