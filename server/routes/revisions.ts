import { Router } from 'express';
import type { Remark } from '../../schemas/api.ts';
import { validateMarkRequest } from '../../schemas/generated/mark-request.js';
import { validateNewRemark } from '../../schemas/generated/new-remark.js';
import { validateNewReply } from '../../schemas/generated/new-reply.js';
import { validateRemarkChange } from '../../schemas/generated/remark-change.js';
import { validateTransition } from '../../schemas/generated/transition.js';
import { bodyOf } from '../http/body.ts';
import { personIn, personInBrowser } from '../http/who.ts';
import { Refusal } from '../problem.ts';
import { bundleOf } from '../services/bundle.ts';
import type { Context } from '../services/context.ts';
import { putMark, removeMark } from '../services/marks.ts';
import { revisionDetail, sourceText } from '../services/read-revision.ts';
import { changeRemark, raiseRemark, replyToRemark } from '../services/remarks.ts';
import { revisionValues } from '../services/takes.ts';
import { moveRevision } from '../services/transitions.ts';
import type { Response } from 'express';

const REVISION = '/studies/:study/sheets/:number/:revision';

export function revisionRoutes(context: Context): Router {
  const router = Router();

  router.get(REVISION, async (request, response) => {
    response.json(await revisionDetail(context, personIn(response), request.params));
  });

  router.post(`${REVISION}/transitions`, async (request, response) => {
    const person = personInBrowser(response);
    response.json(await moveRevision(context, person, request.params, bodyOf(validateTransition, request)));
  });

  router.get(`${REVISION}/bundle`, async (request, response) => {
    const { number, revision } = request.params;
    const text = await bundleOf(context, personIn(response), request.params);
    response.attachment(`${number}-${revision}.bundle.json`).type('application/json').send(text);
  });

  router.get(`${REVISION}/values`, async (request, response) => {
    response.json(await revisionValues(context, personIn(response), request.params));
  });

  router.get(`${REVISION}/files/:name`, async (request, response) => {
    const text = await sourceText(context, personIn(response), request.params, request.params.name);
    response.type('text/plain').send(text);
  });

  reviewRoutes(router, context);
  return router;
}

function reviewRoutes(router: Router, context: Context): void {
  router.put(`${REVISION}/marks`, async (request, response) => {
    response.json(await putMark(context, personIn(response), request.params, bodyOf(validateMarkRequest, request)));
  });

  router.delete(`${REVISION}/marks`, async (request, response) => {
    const { path } = request.query;
    if (typeof path !== 'string') throw new Refusal('bad-request', 'say which block: ?path=…');
    await removeMark(context, personIn(response), request.params, path);
    response.status(204).end();
  });

  router.post(`${REVISION}/remarks`, async (request, response) => {
    const remark = await raiseRemark(context, personIn(response), request.params, bodyOf(validateNewRemark, request));
    sendRemark(response.status(201), remark);
  });

  router.post(`${REVISION}/remarks/:id/replies`, async (request, response) => {
    const { text } = bodyOf(validateNewReply, request);
    sendRemark(response, await replyToRemark(context, personIn(response), request.params, text));
  });

  router.patch(`${REVISION}/remarks/:id`, async (request, response) => {
    const change = bodyOf(validateRemarkChange, request);
    const person = personIn(response);
    sendRemark(response, await changeRemark(context, person, request.params, change, request.get('if-match')));
  });
}

function sendRemark(response: Response, remark: Remark): void {
  response.set('ETag', remark.etag).json(remark);
}
