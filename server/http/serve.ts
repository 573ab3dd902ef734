import type { Request, RequestHandler, Response, Router } from 'express';
import type * as z from 'zod/mini';
import type { AnyEndpoint, Endpoint } from '../../shared/endpoint';
import { crashPoint } from '../pictures/crashPoint';
import type { Asked, RoomAsked, Scope, SignedIn } from '../scope';
import { answerJson, isUnchanged } from './answer';
import { parseInput } from './parseInput';
import { askedOf, roomScope, signedInOf } from './whoAsks';

type Parsed<E extends AnyEndpoint> = {
  params: z.output<E['params']>;
  query: z.output<E['query']>;
  body: z.output<E['body']>;
};

/** What a rule is given besides its scope, by the endpoint's `needs`. */
type ScopeOf<E extends AnyEndpoint> = E['needs'] extends 'public'
  ? Asked
  : E['needs'] extends 'signedIn'
    ? SignedIn
    : Scope;

/** The raw request, for the few that set cookies, receive files or stream. */
export type Raw = { req: Request; res: Response };

type Answer<E extends AnyEndpoint, S> = (scope: S, input: Parsed<E>, raw: Raw) => Promise<z.input<E['output']>>;

type Line = { line: AnyEndpoint };

/** Every endpoint that has been bound, for the matrix test and for 405 answers. */
export const served: Line[] = [];

export type Serve = ReturnType<typeof serveOn>;

/** Binds contract lines to rules. A write runs in one transaction, and bumps the fishroom's change number with it. */
export function serveOn(router: Router) {
  function bind<E extends AnyEndpoint>(line: E, handler: RequestHandler) {
    if (!served.some((one) => one.line === line)) served.push({ line });
    const verb = { GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete' } as const;
    router[verb[line.method]](line.path, handler);
  }

  return {
    /** `needs: 'public'`: nobody need be signed in. No transaction is opened: the rule opens its own if it writes. */
    open<P extends z.ZodMiniType, Q extends z.ZodMiniType, B extends z.ZodMiniType, O extends z.ZodMiniType>(
      line: Endpoint<P, Q, B, O>,
      answer: Answer<Endpoint<P, Q, B, O>, Asked>,
    ) {
      bind(line, async (req, res) => {
        const asked = askedOf(req);
        answerJson(res, line, await answer(asked, parseInput(line, req), { req, res }));
      });
    },

    /** `needs: 'signedIn'`: any account, no fishroom. No transaction is opened. */
    signedIn<P extends z.ZodMiniType, Q extends z.ZodMiniType, B extends z.ZodMiniType, O extends z.ZodMiniType>(
      line: Endpoint<P, Q, B, O>,
      answer: Answer<Endpoint<P, Q, B, O>, SignedIn>,
    ) {
      bind(line, async (req, res) => {
        const scope = await signedInOf(req);
        answerJson(res, line, await answer(scope, parseInput(line, req), { req, res }));
      });
    },

    /** In a fishroom, reading. Answers 304 when nothing in the fishroom changed since the caller's copy. */
    read<P extends z.ZodMiniType, Q extends z.ZodMiniType, B extends z.ZodMiniType, O extends z.ZodMiniType>(
      line: Endpoint<P, Q, B, O>,
      answer: Answer<Endpoint<P, Q, B, O>, Scope>,
    ) {
      bind(line, async (req, res) => {
        const { scope, changeNumber } = await roomScope(req, line.needs);
        const input = parseInput(line, req);
        if (line.kind === 'json' && isUnchanged(req, res, scope, changeNumber)) return;
        const out = await answer(scope, input, { req, res });
        if (line.kind !== 'file') answerJson(res, line, out);
      });
    },

    /** In a fishroom, writing: one transaction, committed before the answer. No mail, file or network inside. */
    write<P extends z.ZodMiniType, Q extends z.ZodMiniType, B extends z.ZodMiniType, O extends z.ZodMiniType>(
      line: Endpoint<P, Q, B, O>,
      answer: Answer<Endpoint<P, Q, B, O>, Scope>,
    ) {
      bind(line, async (req, res) => {
        const { scope } = await roomScope(req, line.needs);
        const input = parseInput(line, req);
        const out = await inTransaction(scope, (inside) => answer(inside, input, { req, res }));
        answerJson(res, line, out);
      });
    },

    /** In a fishroom, for uploads and other work that is not one transaction: the rule calls `inTransaction` itself. */
    work<P extends z.ZodMiniType, Q extends z.ZodMiniType, B extends z.ZodMiniType, O extends z.ZodMiniType>(
      line: Endpoint<P, Q, B, O>,
      answer: Answer<Endpoint<P, Q, B, O>, Scope>,
    ) {
      bind(line, async (req, res) => {
        const { scope } = await roomScope(req, line.needs);
        const out = await answer(scope, parseInput(line, req), { req, res });
        if (line.kind !== 'file') answerJson(res, line, out);
      });
    },
  };
}

/** Runs a rule inside one write transaction of its fishroom. */
export async function inTransaction<S extends RoomAsked, T>(scope: S, rule: (inside: S) => Promise<T>): Promise<T> {
  const stored = await scope.db.transaction().execute(async (db) => {
    const result = await rule({ ...scope, db });
    await db
      .updateTable('room')
      .set(({ eb }) => ({ changeNumber: eb('changeNumber', '+', 1) }))
      .where('id', '=', scope.roomId)
      .execute();
    return result;
  });
  crashPoint(scope.house.config.crashAt)('after-commit');
  return stored;
}

export type { ScopeOf };
