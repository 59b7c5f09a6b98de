import { randomUUID } from 'node:crypto';
import express, { Router, type Express } from 'express';
import helmet from 'helmet';
import { destination, pino, type Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Health } from '../schemas/api.ts';
import { CORE_VERSION } from '../core/version.ts';
import type { ServerConfig } from './config.ts';
import { answerErrors, refuseUnknownRoute } from './http/answer-errors.ts';
import { staticFiles } from './http/static-files.ts';
import { identify, refuseForgery } from './http/who.ts';
import { deviceRoutes } from './routes/device.ts';
import { revisionRoutes } from './routes/revisions.ts';
import { sessionRoutes } from './routes/session.ts';
import { studyRoutes } from './routes/studies.ts';
import { tokenRoutes } from './routes/tokens.ts';
import type { Context } from './services/context.ts';

/** Sources and report of a sheet of the largest size, with room for the JSON around them. */
const BODY_LIMIT = '12mb';

/** The log goes to standard error: standard output is the command's answer. */
export function makeLogger({ logLevel }: Pick<ServerConfig, 'logLevel'>): Logger {
  const redact = ['req.headers.authorization', 'req.headers.cookie', 'res.headers["set-cookie"]'];
  return pino({ level: logLevel, redact }, destination(2));
}

/** The whole application: security headers, log, who is there, the API, the viewer, and the last word on errors. */
export function makeApp(context: Context, logger: Logger): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', 'loopback');
  app.use(pinoHttp({ logger, genReqId: () => randomUUID() }));
  app.use(securityHeaders(context));
  app.use('/api', apiRoutes(context));
  app.use(staticFiles());
  app.use(refuseUnknownRoute);
  app.use(answerErrors);
  return app;
}

function apiRoutes(context: Context): Router {
  const api = Router();
  api.use((_request, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  api.get('/health', (_request, response) => {
    response.json({ status: 'ok', version: CORE_VERSION, serverKey: context.serverKey.publicKey.kid } satisfies Health);
  });
  api.use(identify(context));
  api.use(refuseForgery(context));
  api.use(express.json({ limit: BODY_LIMIT, strict: true }));
  api.use(sessionRoutes(context), tokenRoutes(context), deviceRoutes(context));
  api.use(studyRoutes(context), revisionRoutes(context));
  api.use(refuseUnknownRoute);
  return api;
}

function securityHeaders({ address }: Context): express.RequestHandler {
  const isHttps = address().startsWith('https:');
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        // KaTeX places its glyphs with inline styles.
        styleSrc: ["'self'", "'unsafe-inline'"],
        fontSrc: ["'self'", 'data:'],
        imgSrc: ["'self'", 'data:'],
        workerSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    // Without a certificate these would only lock people out.
    strictTransportSecurity: isHttps,
    crossOriginOpenerPolicy: isHttps,
    originAgentCluster: isHttps,
  });
}
