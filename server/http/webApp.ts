import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { join, relative, sep } from 'node:path';
import express, { type Router } from 'express';
import expressStaticGzip from 'express-static-gzip';
import { notFound } from '../../shared/refusal';

const IMMUTABLE = 'public, max-age=31536000, immutable';

/** The web export: hashed files for a year, everything else revalidated, unknown pages get the app's own page. */
export function webApp(folder: string): Router {
  const router = express.Router();
  router.use(
    expressStaticGzip(folder, {
      enableBrotli: true,
      orderPreference: ['br', 'gz'],
      index: false,
      serveStatic: {
        cacheControl: false,
        dotfiles: 'ignore',
        setHeaders: (res, file) => {
          const path = relative(folder, file).split(sep).join('/');
          const hashed = path.startsWith('_expo/static/') || path.startsWith('assets/');
          res.setHeader('Cache-Control', hashed ? IMMUTABLE : 'no-cache');
        },
      },
    }),
  );
  // A missing hashed file must be a 404, never the page: a browser would keep the page as a script.
  router.use(['/_expo', '/assets', '/fonts'], () => {
    throw notFound('That file');
  });
  router.get('/{*page}', (req, res, next) => {
    if (!req.accepts('html') || /\.(map|env|db|db-wal|json|git)$/.test(req.path) || req.path.includes('/.'))
      throw notFound();
    sendPage(res, folder, next);
  });
  return router;
}

export function sendPage(res: express.Response, folder: string, next: express.NextFunction): void {
  res.setHeader('Cache-Control', 'no-cache');
  if (existsSync(join(folder, 'index.html')))
    res.sendFile('index.html', { root: folder, cacheControl: false }, (error) => error && next(error));
  else next(notFound('The web app has not been built. That page'));
}

/** CSP sources for the inline snippets of the exported page; none when it is not built yet. */
export function inlineScriptHashes(folder: string): string[] {
  const file = join(folder, 'index.html');
  if (!existsSync(file)) return [];
  const page = readFileSync(file, 'utf8');
  return [...page.matchAll(/<script(?![^>]*\ssrc=)[^>]*>([\s\S]*?)<\/script>/g)].map(
    ([, code = '']) => `'sha256-${createHash('sha256').update(code).digest('base64')}'`,
  );
}
