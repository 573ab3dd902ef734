import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type * as z from 'zod/mini';
import { appOf } from '@/server/app';
import { buildHouse } from '@/server/buildHouse';
import { type Config, readConfig } from '@/server/config';
import type { House } from '@/server/house';
import type { Endpoint } from '@/shared/endpoint';
import { uuidV7 } from '@/shared/ids';

type Shape = z.ZodMiniType;

/** A real server on a real port with a real file, a clock that stands still until it is moved, and a local mail sink. */
export type TestApp = {
  house: House;
  origin: string;
  /** Moves the clock forward. */
  later(span: { minutes?: number; days?: number }): void;
  /** A browser of its own: it keeps its cookie. */
  person(): Person;
  close(): Promise<void>;
};

export type Answered<T> = { status: number; body: T; headers: Headers };

export type Person = {
  cookie: string;
  /** Asks an endpoint; the body is whatever came back, an error included. */
  ask<P extends Shape, Q extends Shape, B extends Shape, O extends Shape>(
    line: Endpoint<P, Q, B, O>,
    sent?: { params?: unknown; query?: Record<string, unknown>; body?: unknown; headers?: Record<string, string> },
  ): Promise<
    Answered<
      z.output<O> & { error?: { reason: string; message: string; fields?: Record<string, string>; current?: unknown } }
    >
  >;
  /** Asks, and fails the test unless the answer is a success. */
  get<P extends Shape, Q extends Shape, B extends Shape, O extends Shape>(
    line: Endpoint<P, Q, B, O>,
    sent?: { params?: unknown; query?: Record<string, unknown>; body?: unknown },
  ): Promise<z.output<O>>;
  raw(method: string, path: string, request?: { body?: BodyInit; headers?: Record<string, string> }): Promise<Response>;
};

export const START = '2026-05-14T09:12:00.000Z';

/** `log`: where the server's log goes, for tests that read it. */
export async function testApp(changes: Partial<Config> = {}, log?: House['log']): Promise<TestApp> {
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-'));
  let nowMs = Date.parse(START);
  const config: Config = {
    ...readConfig({
      NODE_ENV: 'test',
      DATA_FOLDER: join(folder, 'data'),
      UPLOADS_FOLDER: join(folder, 'uploads'),
      LOG_LEVEL: 'silent',
      DEMO: '0',
    }),
    secret: randomBytes(48).toString('base64url'),
    ...changes,
  };
  const { house, close } = await buildHouse(config, { now: () => new Date(nowMs) });
  if (log) house.log = log;
  const server: Server = createServer(appOf(house));
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  const { port } = server.address() as AddressInfo;
  const origin = `http://127.0.0.1:${port}`;
  if (house.standIn) house.standIn.deliverTo = `${origin}/webhooks/stripe`;
  return {
    house,
    origin,
    later: ({ minutes = 0, days = 0 }) => {
      nowMs += minutes * 60_000 + days * 86_400_000;
    },
    person: () => personAt(origin),
    close: async () => {
      server.closeAllConnections();
      await new Promise((closed) => server.close(closed));
      await close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

export function personAt(origin: string): Person {
  const person: Person = {
    cookie: '',
    async raw(method, path, request = {}) {
      const answer = await fetch(`${origin}${path}`, {
        method,
        redirect: 'manual',
        headers: { ...(person.cookie ? { cookie: person.cookie } : {}), ...request.headers },
        ...(request.body === undefined ? {} : { body: request.body }),
      });
      for (const set of answer.headers.getSetCookie())
        person.cookie = /Max-Age=0|Expires=Thu, 01 Jan 1970/.test(set) ? '' : (set.split(';')[0] ?? '');
      return answer;
    },
    async ask(line, sent = {}) {
      const params = Object(sent.params ?? {});
      const path = line.path.replace(/:([A-Za-z]+)/g, (_all, name: string) => encodeURIComponent(String(params[name])));
      const query = new URLSearchParams();
      for (const [key, value] of Object.entries(sent.query ?? {}))
        if (value !== undefined) query.set(key, String(value));
      const text = query.toString();
      const hasBody = line.method !== 'GET' && sent.body !== undefined;
      const answer = await person.raw(line.method, text ? `${path}?${text}` : path, {
        headers: { ...(hasBody ? { 'content-type': 'application/json' } : {}), ...sent.headers },
        ...(hasBody ? { body: JSON.stringify(sent.body) } : {}),
      });
      const body = (answer.headers.get('content-type') ?? '').includes('json') ? await answer.json() : null;
      return { status: answer.status, body, headers: answer.headers };
    },
    async get(line, sent = {}) {
      const answer = await person.ask(line, sent);
      if (answer.status >= 300)
        throw new Error(`${line.method} ${line.path}: ${answer.status} ${JSON.stringify(answer.body)}`);
      return line.output.parse(answer.body);
    },
  };
  return person;
}

let counter = 0;
/** Ids in the order of their making. */
export const makeId = (): string => {
  counter += 1;
  return uuidV7(Date.parse(START) + counter, randomBytes(10));
};
