import compression from 'compression';
import express, { type Express } from 'express';
import pinoHttp from 'pino-http';
import { newId } from './db/newId';
import { features } from './features';
import type { House } from './house';
import { answerErrors, answerUnknown } from './http/answerErrors';
import { jsonOnly, sameOriginOnly } from './http/guards';
import { securityHeaders } from './http/headers';
import { type Serve, serveOn } from './http/serve';
import { inlineScriptHashes, webApp } from './http/webApp';

/** Builds the Express app of a house. Tests use the same one. */
export function appOf(house: House): Express {
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('trust proxy', house.config.proxies === 0 ? false : house.config.proxies);
  app.set('query parser', 'simple');
  app.locals['house'] = house;

  app.use(securityHeaders(house.config, inlineScriptHashes(house.config.webFolder)));
  app.use((_req, res, next) => {
    res.locals['now'] = house.clock.now().toISOString();
    res.locals['requestId'] = newId(String(res.locals['now']));
    res.setHeader('X-Request-Id', String(res.locals['requestId']));
    next();
  });
  app.use(requestLog(house));
  app.use(compression());
  app.get('/healthz', (_req, res) => void res.set('Cache-Control', 'no-store').json({ ok: true }));

  for (const feature of features) feature.before?.(app, house);
  app.use('/api', sameOriginOnly(house.config), jsonOnly, express.json({ limit: '200kb', strict: true }));
  app.use('/api', (_req, res, next) => {
    res.setHeader('Cache-Control', 'no-store');
    next();
  });
  const router = express.Router();
  const serve: Serve = serveOn(router);
  for (const feature of features) feature.routes?.(serve);
  app.use(router);
  app.use('/api', answerUnknown);
  for (const feature of features) feature.pages?.(app, house);
  app.use(webApp(house.config.webFolder));
  app.use(answerErrors);
  return app;
}

/** One JSON line a request. The address is logged without its query, which may hold a token. */
function requestLog({ log }: House) {
  return pinoHttp({
    logger: log,
    genReqId: (_req, res) => res.getHeader('x-request-id')?.toString() ?? '',
    serializers: {
      req: (req: { id: string; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        path: withoutSecrets(req.url),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
    customLogLevel: (_req, res, error) =>
      error || res.statusCode >= 500 ? 'error' : res.statusCode >= 400 ? 'warn' : 'debug',
  });
}

/** Tokens stand in some addresses: the sheet's, the buyer's, the calendar's. Only their first letters are logged. */
const withoutSecrets = (url: string): string =>
  (url.split('?')[0] ?? '').replace(/[\w-]{20,}/g, (word) =>
    /^[0-9a-f-]{36}$/.test(word) ? word : `${word.slice(0, 4)}…`,
  );
