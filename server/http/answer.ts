import type { Request, Response } from 'express';
import type * as z from 'zod/mini';
import type { AnyEndpoint } from '../../shared/endpoint';
import type { Scope } from '../scope';

/** Strips what the contract does not name, so that no column leaks by accident: the output shape is the presenter. */
export function answerJson(res: Response, line: AnyEndpoint, out: z.input<AnyEndpoint['output']>): void {
  if (res.headersSent) return;
  res.json(line.output.parse(out));
}

/**
 * Answers 304 when the caller's copy is of this fishroom's present state. The tag also holds the role and the day: the same
 * address says something else to another role, and tomorrow.
 */
export function isUnchanged(req: Request, res: Response, scope: Scope, changeNumber: number): boolean {
  const tag = `W/"${changeNumber}-${scope.role}-${scope.today}-${scope.accountId.slice(-6)}"`;
  res.setHeader('ETag', tag);
  res.setHeader('Cache-Control', 'private, no-cache');
  if (req.get('if-none-match') !== tag) return false;
  res.status(304).end();
  return true;
}
