import type { Request } from 'express';
import type * as z from 'zod/mini';
import type { Endpoint } from '../../shared/endpoint';
import { fieldsOf } from '../../shared/fieldsOf';
import { notFound, Refusal } from '../../shared/refusal';

/** Judges the three parts of a request, each by its own strict shape; nothing is merged, so no part can stand in for another. */
export function parseInput<P extends z.ZodMiniType, Q extends z.ZodMiniType, B extends z.ZodMiniType>(
  line: Endpoint<P, Q, B, z.ZodMiniType>,
  req: Request,
): { params: z.output<P>; query: z.output<Q>; body: z.output<B> } {
  const params = line.params.safeParse({ ...req.params });
  // An id of the wrong form is an id that does not exist.
  if (!params.success) throw notFound();
  const query = line.query.safeParse({ ...req.query });
  const body = line.body.safeParse(line.kind === 'upload' ? {} : (req.body ?? {}));
  if (!query.success || !body.success) {
    const fields = { ...(query.success ? {} : fieldsOf(query.error)), ...(body.success ? {} : fieldsOf(body.error)) };
    throw new Refusal('invalid', 'Some of that needs another look', fields);
  }
  return { params: params.data, query: query.data, body: body.data };
}
