import { Router } from 'express';
import { validatePush } from '../../schemas/generated/push.js';
import { bodyOf } from '../http/body.ts';
import { personIn } from '../http/who.ts';
import type { Context } from '../services/context.ts';
import { deskOf } from '../services/desk.ts';
import { pushSheet } from '../services/push.ts';
import { listRevisions } from '../services/read-revision.ts';
import { listStudies, studyDetail } from '../services/studies.ts';

export function studyRoutes(context: Context): Router {
  const router = Router();

  router.get('/desk', async (_request, response) => {
    response.json(await deskOf(context, personIn(response)));
  });

  router.get('/studies', async (_request, response) => {
    response.json(await listStudies(context, personIn(response)));
  });

  router.get('/studies/:study', async (request, response) => {
    response.json(await studyDetail(context, personIn(response), request.params.study));
  });

  router.post('/studies/:study/sheets', async (request, response) => {
    const person = personIn(response);
    response.status(201).json(await pushSheet(context, person, request.params.study, bodyOf(validatePush, request)));
  });

  router.get('/studies/:study/sheets/:number', async (request, response) => {
    const { study, number } = request.params;
    response.json(await listRevisions(context, personIn(response), study, number));
  });

  return router;
}
