import * as z from 'zod/mini';
import { Id } from './ids';
import type { Action } from './roles';

/** Who may ask: an action of the roles table (in a fishroom), or one of the doors that need no fishroom. */
export type Needs = Action | 'public' | 'signedIn' | 'buyer';

type Shape = z.ZodMiniType;

/**
 * One line of the contract between server and browser. The server binds a function to it, the browser calls it, the tests
 * are generated from it. `kind`: `json` (the default), `upload` (multipart in, JSON out) or `file` (bytes out).
 */
export type Endpoint<
  P extends Shape = Shape,
  Q extends Shape = Shape,
  B extends Shape = Shape,
  O extends Shape = Shape,
> = {
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  path: string;
  needs: Needs;
  kind: 'json' | 'upload' | 'file';
  params: P;
  query: Q;
  body: B;
  output: O;
};

export type AnyEndpoint = Endpoint;

const Nothing = z.strictObject({});
type Nothing = typeof Nothing;

export function endpoint<
  O extends Shape,
  P extends Shape = Nothing,
  Q extends Shape = Nothing,
  B extends Shape = Nothing,
>(line: {
  method: Endpoint['method'];
  path: string;
  needs: Needs;
  kind?: Endpoint['kind'];
  params?: P;
  query?: Q;
  body?: B;
  output: O;
}): Endpoint<P, Q, B, O> {
  const { method, path, needs, kind = 'json', output } = line;
  // The defaults are the empty shape exactly when the type parameter was left at its default.
  const params = (line.params ?? Nothing) as P;
  const query = (line.query ?? Nothing) as Q;
  const body = (line.body ?? Nothing) as B;
  return { method, path, needs, kind, params, query, body, output };
}

/** The parameters of a path under `/api/rooms/:roomId`. */
export const inRoom = <S extends z.core.$ZodLooseShape>(shape: S) => z.strictObject({ roomId: Id, ...shape });

/** What most writes answer. */
export const Done = z.strictObject({ ok: z.literal(true) });
export const DONE = { ok: true } as const;
