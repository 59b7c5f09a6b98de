import type { CookieOptions, Request, Response } from 'express';
import { IDLE_MS } from '../services/sessions.ts';

const NAME = 'antinode_session';

/** Cookies belong to a host and not to its port, so two servers on one machine would sign each other's people out. */
function cookieName(request: Request): string {
  const port = /:(\d+)$/.exec(request.get('host') ?? '')?.[1];
  return port === undefined ? NAME : `${NAME}_${port}`;
}

export function readSessionCookie(request: Request): string | undefined {
  const name = cookieName(request);
  for (const part of (request.get('cookie') ?? '').split(';')) {
    const [key, value] = part.trim().split('=', 2);
    if (key === name && value !== undefined && value !== '') return value;
  }
  return undefined;
}

export function writeSessionCookie(request: Request, response: Response, secret: string, isSecure: boolean): void {
  response.cookie(cookieName(request), secret, { ...options(isSecure), maxAge: IDLE_MS });
}

export function clearSessionCookie(request: Request, response: Response, isSecure: boolean): void {
  response.clearCookie(cookieName(request), options(isSecure));
}

function options(isSecure: boolean): CookieOptions {
  return { httpOnly: true, sameSite: 'lax', secure: isSecure, path: '/' };
}
