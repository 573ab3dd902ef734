import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { queryNumber } from '../shapes';

/** One change or removal that was not an entry. `change`: what it was before and after, by field. */
export const AuditLine = z.strictObject({
  id: Id,
  at: z.string(),
  /** Null for the program itself, and for an account that was deleted. */
  by: z.nullable(z.strictObject({ id: Id, name: z.string() })),
  action: z.string(),
  about: z.string(),
  aboutId: z.nullable(z.string()),
  change: z.record(z.string(), z.tuple([z.unknown(), z.unknown()])),
});
export type AuditLine = z.output<typeof AuditLine>;

/** Newest first; `before` is the id of the last line shown. */
export const listAudit = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/audit',
  needs: 'audit:see',
  params: inRoom({}),
  query: z.strictObject({
    before: z.optional(Id),
    limit: z.optional(queryNumber(200)),
    aboutId: z.optional(z.string().check(z.maxLength(80, 'That is too long'))),
  }),
  output: z.strictObject({ lines: z.array(AuditLine), more: z.boolean() }),
});
