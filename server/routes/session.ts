import { Router } from 'express';
import { rateLimit } from 'express-rate-limit';
import type { Session } from '../../schemas/api.ts';
import { validateSignIn } from '../../schemas/generated/sign-in.js';
import { bodyOf } from '../http/body.ts';
import { clearSessionCookie, writeSessionCookie } from '../http/cookies.ts';
import { callerIn } from '../http/who.ts';
import { Refusal } from '../problem.ts';
import type { Context } from '../services/context.ts';
import { endSession, signIn } from '../services/sessions.ts';

/** From one address; each account rests on its own as well (services/sign-in.ts). */
const SIGN_INS_PER_WINDOW = 30;
const WINDOW_MS = 5 * 60 * 1000;

export function sessionRoutes(context: Context): Router {
  const router = Router();
  const isSecure = (): boolean => context.address().startsWith('https:');

  router.get('/session', (_request, response) => {
    const caller = callerIn(response);
    const session: Session =
      caller.by === 'session'
        ? { person: caller.person, csrf: caller.session.csrf }
        : { person: personOf(caller), csrf: '' };
    response.json(session);
  });

  router.post('/session', limitSignIns(), async (request, response) => {
    const { person, csrf, secret } = await signIn(context, bodyOf(validateSignIn, request));
    const caller = callerIn(response);
    if (caller.by === 'session') await endSession(context, caller.session.secretHash);
    writeSessionCookie(request, response, secret, isSecure());
    response.json({ person, csrf } satisfies Session);
  });

  router.delete('/session', async (request, response) => {
    const caller = callerIn(response);
    if (caller.by === 'session') await endSession(context, caller.session.secretHash);
    clearSessionCookie(request, response, isSecure());
    response.status(204).end();
  });

  return router;
}

function personOf(caller: ReturnType<typeof callerIn>): Session['person'] {
  return caller.by === 'token' ? caller.person : null;
}

function limitSignIns() {
  return rateLimit({
    windowMs: WINDOW_MS,
    limit: SIGN_INS_PER_WINDOW,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    handler: () => {
      throw new Refusal('too-many-requests', 'too many sign-ins from your address; wait five minutes', {
        retryAfter: WINDOW_MS / 1000,
      });
    },
  });
}
