import { type RateLimitRequestHandler, rateLimit } from 'express-rate-limit';
import { Refusal } from '../../shared/refusal';
import type { Raw } from './serve';

const MINUTE = 60_000;

type Limit = (raw: Raw, key?: string) => Promise<void>;

/**
 * A limit that a rule asks for in the middle of its answer, since its key may come from the body. It counts the request, and
 * with `failuresOnly` takes it back when the answer is a success. The caller's address is Express's, behind as many proxies as
 * the settings say: a made-up X-Forwarded-For changes nothing.
 */
export function limitOf(limit: number, minutes: number, { failuresOnly = false } = {}): Limit {
  const byKey: RateLimitRequestHandler = rateLimit({
    limit,
    windowMs: minutes * MINUTE,
    skipSuccessfulRequests: failuresOnly,
    standardHeaders: false,
    legacyHeaders: false,
    validate: { xForwardedForHeader: false, forwardedHeader: false },
    keyGenerator: (req) => String(req.res?.locals['limitKey']),
    handler: (req, _res, next) => {
      const { resetTime } = Object(Reflect.get(req, 'rateLimit'));
      const ms = resetTime instanceof Date ? resetTime.getTime() - Date.now() : minutes * MINUTE;
      const retryAfter = Math.max(1, Math.ceil(ms / 1000));
      const wait = retryAfter < 90 ? `${retryAfter} seconds` : `${Math.ceil(retryAfter / 60)} minutes`;
      next(new Refusal('too-many', `Too many tries. Wait ${wait}, then try again.`, {}, { retryAfter }));
    },
  });
  return ({ req, res }, key) =>
    new Promise((go, stop) => {
      res.locals['limitKey'] = key ?? networkOf(req.ip ?? '');
      void byKey(req, res, (error?: unknown) => (error ? stop(error) : go()));
    });
}

/** One home has a whole IPv6 /64, so its addresses count as one. */
const networkOf = (ip: string): string =>
  ip.includes(':') && !ip.startsWith('::ffff:') ? ip.split(':').slice(0, 4).join(':') : ip;
