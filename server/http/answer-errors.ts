import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express';
import { loggable } from '../db/failure.ts';
import { notFound, Refusal } from '../problem.ts';

/** Routes that are not there are answered like all other refusals. */
export const refuseUnknownRoute: RequestHandler = (request) => {
  throw new Refusal('not-found', `there is no ${request.method} ${request.path}`);
};

/**
 * The last handler: every error becomes a problem document (RFC 9457). What the server did wrong is logged in full and
 * told in one sentence, with the request's id to find it by.
 */
export const answerErrors: ErrorRequestHandler = (cause: unknown, request, response, next) => {
  if (response.headersSent) {
    next(cause);
    return;
  }
  const refusal = asRefusal(cause);
  if (refusal.status >= 500 && !(cause instanceof Refusal))
    request.log.error({ failure: loggable(cause) }, 'request failed');
  send(response, refusal, requestId(request));
};

/** Made by us for each request (app.ts), so always a text. */
function requestId({ id }: Request): string {
  return typeof id === 'string' ? id : '';
}

function send(response: Response, refusal: Refusal, requestId: string): void {
  const { retryAfter } = refusal.parts;
  if (retryAfter !== undefined) response.set('Retry-After', String(retryAfter));
  if (refusal.status === 401) response.set('WWW-Authenticate', 'Bearer');
  response
    .status(refusal.status)
    .type('application/problem+json')
    .send(JSON.stringify(refusal.toProblem(requestId)));
}

function asRefusal(cause: unknown): Refusal {
  if (cause instanceof Refusal) return cause;
  switch (typeOf(cause)) {
    case 'entity.too.large':
      return new Refusal('too-large', 'the body of the request is too large');
    case 'entity.parse.failed':
      return new Refusal('bad-body', 'the body is not JSON');
    case 'encoding.unsupported':
    case 'charset.unsupported':
    case 'request.size.invalid':
    case 'request.aborted':
      return new Refusal('bad-request', 'the body of the request can’t be read');
    default:
      if (cause instanceof URIError) return notFound('such page');
      return new Refusal(
        'internal',
        'the server failed at this request; what you typed is still with you. Try again, or tell the administrator the request id',
      );
  }
}

/** Express and its body parser name their own errors by `type`. */
function typeOf(cause: unknown): string {
  return cause instanceof Error && 'type' in cause && typeof cause.type === 'string' ? cause.type : '';
}
