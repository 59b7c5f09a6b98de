import { Router } from 'express';
import { validateNewToken } from '../../schemas/generated/new-token.js';
import { bodyOf } from '../http/body.ts';
import { callerIn, personIn, personInBrowser } from '../http/who.ts';
import type { Context } from '../services/context.ts';
import { createToken, listTokens, revokeToken } from '../services/tokens.ts';

export function tokenRoutes(context: Context): Router {
  const router = Router();

  router.get('/tokens', async (_request, response) => {
    response.json(await listTokens(context, personIn(response)));
  });

  router.post('/tokens', async (request, response) => {
    const person = personInBrowser(response);
    const { label } = bodyOf(validateNewToken, request);
    response.status(201).json(await createToken(context.db, person.id, label, context.now()));
  });

  router.delete('/tokens/:id', async (request, response) => {
    const person = personIn(response);
    const caller = callerIn(response);
    // A command line that signs out revokes the token that it comes with, whose id it need not know.
    const id = request.params.id === 'current' && caller.by === 'token' ? caller.tokenId : request.params.id;
    await revokeToken(context, person, id);
    response.status(204).end();
  });

  return router;
}
