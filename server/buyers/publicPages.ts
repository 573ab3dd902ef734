import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Express, Request, Response } from 'express';
import { RoomWord } from '../../shared/buyers/available';
import { Refusal } from '../../shared/refusal';
import type { House } from '../house';
import { sendPage } from '../http/webApp';
import { askedOf } from '../http/whoAsks';
import { availablePage } from './available';
import { bootPage } from './bootPage';

/** The availability page as it is sent: readable before, and without, its script. */
export function publicPages(app: Express, house: House): void {
  app.get('/available/:slug', async (req, res, next) => {
    const { webFolder } = house.config;
    const page = await pageFor(req, res);
    const template = page ? await readFile(join(webFolder, 'index.html'), 'utf8').catch(() => null) : null;
    if (!page || template === null) return sendPage(res, webFolder, next);
    res
      .set('Cache-Control', 'no-cache')
      .type('html')
      .send(bootPage(template, page, house.config.origin));
  });
  // Pages behind a link of a letter: not for search engines, nor for other sites.
  app.use('/asked', (_req, res, next) => {
    res.set({ 'X-Robots-Tag': 'noindex', 'Referrer-Policy': 'no-referrer' });
    next();
  });
}

/** Null, and a 404 with the app's own page, where there is no such fishroom. */
async function pageFor(req: Request, res: Response) {
  const slug = RoomWord.safeParse(req.params['slug']);
  try {
    if (slug.success) return await availablePage(askedOf(req), slug.data);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
  }
  res.status(404);
  return null;
}
