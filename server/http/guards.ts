import type { RequestHandler } from 'express';
import { Refusal } from '../../shared/refusal';
import type { Config } from '../config';

const READING = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Nothing is changed on the word of another site: a changing request must say that it comes from our own pages. Browsers send
 * Sec-Fetch-Site and Origin themselves and no script can forge them; a client without either is no browser and has no cookie to steal.
 */
export function sameOriginOnly({ origin }: Config): RequestHandler {
  return (req, _res, next) => {
    if (READING.has(req.method)) return next();
    const site = req.get('sec-fetch-site');
    const from = req.get('origin');
    const foreignSite = site !== undefined && site !== 'same-origin' && site !== 'none';
    const foreignOrigin = from !== undefined && from !== origin && from !== `${req.protocol}://${req.get('host')}`;
    if (foreignSite || foreignOrigin) throw new Refusal('forbidden', 'This request came from another site');
    next();
  };
}

/** Bodies are JSON, or multipart where pictures are taken; a form's encodings trigger no preflight, so they are refused. */
export const jsonOnly: RequestHandler = (req, _res, next) => {
  const hasBody = Number(req.get('content-length') ?? 0) > 0 || req.get('transfer-encoding') !== undefined;
  if (READING.has(req.method) || !hasBody) return next();
  if (req.is('application/json') || req.is('multipart/form-data')) return next();
  throw new Refusal('unsupported', 'Send JSON');
};
