import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';
import { WEB_ROOT } from '../places.ts';

/** The built viewer. Its pages are one page: the router in the browser shows the rest. */
export function staticFiles(): Router {
  const router = Router();
  const page = join(WEB_ROOT, 'index.html');
  if (!existsSync(page)) return router;
  // Names of built assets carry a digest of their content, so they never change.
  router.use(
    '/assets',
    express.static(join(WEB_ROOT, 'assets'), { immutable: true, maxAge: '365d', fallthrough: false }),
  );
  router.use(express.static(WEB_ROOT, { index: false }));
  router.get('/{*page}', (request, response, next) => {
    if (request.accepts('html') === false) next();
    else response.set('Cache-Control', 'no-cache').sendFile(page);
  });
  return router;
}
