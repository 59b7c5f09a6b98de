import { Router } from 'express';
import { rateLimit } from 'express-rate-limit';
import { validateDeviceDecision } from '../../schemas/generated/device-decision.js';
import { validateDevicePoll } from '../../schemas/generated/device-poll.js';
import { validateDeviceRequest } from '../../schemas/generated/device-request.js';
import { bodyOf } from '../http/body.ts';
import { personInBrowser } from '../http/who.ts';
import { Refusal } from '../problem.ts';
import type { Context } from '../services/context.ts';
import { authorizeDevice, decideDevice, inquireDevice, pollDevice } from '../services/device-grants.ts';

const WINDOW_MS = 60 * 1000;

/** The device flow of RFC 8628: a command line asks, a person approves in the browser. */
export function deviceRoutes(context: Context): Router {
  const router = Router();

  router.post('/device/authorize', limit(20), async (request, response) => {
    response.json(await authorizeDevice(context, bodyOf(validateDeviceRequest, request).client));
  });

  router.post('/device/token', async (request, response) => {
    const answer = await pollDevice(context, bodyOf(validateDevicePoll, request).device_code);
    response.status('error' in answer ? 400 : 200).json(answer);
  });

  // Few tries: a user code is short enough to be guessed by one who may try without end.
  router.get('/device/:userCode', limit(30), async (request, response) => {
    personInBrowser(response);
    response.json(await inquireDevice(context, request.params['userCode'] as string));
  });

  router.post('/device/:userCode', limit(30), async (request, response) => {
    const person = personInBrowser(response);
    const { approve } = bodyOf(validateDeviceDecision, request);
    await decideDevice(context, person, request.params['userCode'] as string, approve);
    response.status(204).end();
  });

  return router;
}

function limit(requests: number) {
  return rateLimit({
    windowMs: WINDOW_MS,
    limit: requests,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: () => {
      throw new Refusal('too-many-requests', 'too many requests; wait a minute', { retryAfter: WINDOW_MS / 1000 });
    },
  });
}
