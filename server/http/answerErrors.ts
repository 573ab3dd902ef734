import type { ErrorRequestHandler, RequestHandler } from 'express';
import * as z from 'zod/mini';
import { fieldsOf } from '../../shared/fieldsOf';
import { Refusal, STATUS } from '../../shared/refusal';
import { constraintRefusal } from '../db/constraint';
import { served } from './serve';

/** An address under /api that no line of the contract has: 405 when another verb would do, else 404. */
export const answerUnknown: RequestHandler = (req) => {
  const path = `${req.baseUrl}${req.path}`;
  const verbs = served.filter(({ line }) => patternOf(line.path).test(path)).map(({ line }) => line.method);
  if (verbs.length === 0) throw new Refusal('not-found', 'There is nothing at this address');
  req.res?.setHeader('Allow', [...new Set(verbs)].join(', '));
  throw new Refusal('wrong-method', 'This address does not take that kind of request');
};

const patternOf = (path: string) => new RegExp(`^${path.replace(/:[A-Za-z]+/g, '[^/]+')}/?$`);

/** The last of the chain: a refusal in its own words, anything else as one calm sentence; the detail goes to the log only. */
export const answerErrors: ErrorRequestHandler = (error, req, res, next) => {
  if (res.headersSent) {
    next(error);
    return;
  }
  const refusal = refusalOf(error);
  if (refusal.reason === 'broken') req.log.error({ err: error, event: 'broken' }, 'unexpected error');
  const { reason, message, fields, current, retryAfter } = refusal;
  if (retryAfter !== undefined) res.setHeader('Retry-After', String(retryAfter));
  res.setHeader('Cache-Control', 'no-store');
  res.status(STATUS[reason]).json({
    error: {
      reason,
      message,
      ...(Object.keys(fields).length > 0 ? { fields } : {}),
      ...(current === undefined ? {} : { current }),
      requestId: res.locals['requestId'],
    },
  });
};

function refusalOf(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  const broken = new Refusal(
    'broken',
    'Something went wrong here. Nothing was saved. Try again, and tell us if it stays.',
  );
  if (error instanceof z.core.$ZodError) {
    // A shape that the server itself did not keep is a fault of ours, not of the caller.
    return Object.keys(fieldsOf(error)).length > 0 ? broken : broken;
  }
  if (!(error instanceof Error)) return broken;
  return constraintRefusal(error) ?? parserRefusal(error) ?? broken;
}

/** What Express and its body parser throw before any rule is asked. */
function parserRefusal(error: Error): Refusal | null {
  const type = 'type' in error ? String(error.type) : '';
  const status = 'status' in error ? Number(error.status) : 0;
  if (type === 'entity.too.large') return new Refusal('too-large', 'That is more than can be taken at once');
  if (type === 'encoding.unsupported' || type === 'charset.unsupported')
    return new Refusal('unsupported', 'Send JSON in UTF-8');
  if (type.startsWith('entity.') || type.startsWith('request.') || error instanceof URIError || status === 400) {
    return new Refusal('malformed', 'That could not be read');
  }
  return null;
}
