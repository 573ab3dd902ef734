import { createHash } from 'node:crypto';
import { sql } from 'kysely';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { served } from '@/server/http/serve';
import { may, ROLES, type Role } from '@/shared/roles';
import { type Known, memberOf, ownerWithRoom, personWithAccount } from '../support/accounts';
import { allEndpoints, type Named } from '../support/endpoints';
import { makeId, type Person, START, type TestApp, testApp } from '../support/testApp';

/*
 * The authorisation matrix (OWASP Authorization Regression Testing): every endpoint of every contract, asked by everyone.
 * What a role may do is the roles table's; here it is held against what the server does.
 */

const endpoints = await allEndpoints();
const inRoom = endpoints.filter(({ line }) => line.path.startsWith('/api/rooms/:roomId'));

let app: TestApp;
let roomId: string;
let people: Record<Role, Known>;
let stranger: Known;
let removed: Known;

beforeAll(async () => {
  app = await testApp();
  const made = await ownerWithRoom(app);
  roomId = made.roomId;
  people = {
    owner: made.owner,
    keeper: await memberOf(app, roomId, 'keeper'),
    helper: await memberOf(app, roomId, 'helper'),
    viewer: await memberOf(app, roomId, 'viewer'),
  };
  // Another owner, so that leaving or being demoted is not refused as the last one's.
  await memberOf(app, roomId, 'owner');
  stranger = (await ownerWithRoom(app)).owner;
  removed = await memberOf(app, roomId, 'owner');
  await app.house.db.deleteFrom('member').where('roomId', '=', roomId).where('accountId', '=', removed.id).execute();
});
afterAll(() => app.close());

/** Some endpoints let a person leave, or change a role: everyone is put back before each. */
beforeEach(async () => {
  const { db } = app.house;
  for (const role of ROLES) {
    await db
      .insertInto('member')
      .values({ roomId, accountId: people[role].id, role, joinedAt: START })
      .onConflict((clash) => clash.columns(['roomId', 'accountId']).doUpdateSet({ role }))
      .execute();
  }
});

/** Words that some paths take instead of an id. */
const WORDS: Record<string, string> = { size: 'small', paper: 'a4' };

/** Ids that no row has. */
const paramsOf = ({ line }: Named, room: string): Record<string, string> =>
  Object.fromEntries(
    [...line.path.matchAll(/:([A-Za-z]+)/g)].map(([, name = '']) => [
      name,
      name === 'roomId' ? room : (WORDS[name] ?? makeId()),
    ]),
  );

async function ask(person: Person, one: Named, room = roomId) {
  const headers: Record<string, string> =
    one.line.kind === 'upload' ? { 'content-type': 'multipart/form-data; boundary=x' } : {};
  const answer = await person.ask(one.line, {
    params: paramsOf(one, room),
    ...(one.line.method === 'GET' ? {} : { body: {} }),
    headers,
  });
  const { requestId: _requestId, ...error } = (answer.body as { error?: { requestId?: string } } | null)?.error ?? {};
  return { status: answer.status, error };
}

/** All rows of all tables of the fishroom, as one number: what must not change. */
async function rowsHash(): Promise<string> {
  const { rows: tables } = await sql<{ name: string }>`
    select m.name from sqlite_master m where m.type = 'table' and exists (select 1 from pragma_table_info(m.name) where name = 'roomId')
  `.execute(app.house.db);
  const hash = createHash('sha256');
  for (const { name } of tables) {
    const { rows } = await sql`select * from ${sql.table(name)} where roomId = ${roomId}`.execute(app.house.db);
    hash.update(name).update(JSON.stringify(rows));
  }
  return hash.digest('hex');
}

test('every endpoint of the contracts is served, and nothing else is', () => {
  const missing = endpoints.filter(({ line }) => !served.some((one) => one.line === line)).map(({ name }) => name);
  expect(missing.join(', ')).toBe('');
  const unknown = served
    .filter(({ line }) => !endpoints.some((one) => one.line === line))
    .map(({ line }) => `${line.method} ${line.path}`);
  expect(unknown.join(', ')).toBe('');
  const addresses = endpoints.map(({ line }) => `${line.method} ${line.path.replace(/:\w+/g, ':')}`);
  expect(addresses.filter((address, i) => addresses.indexOf(address) !== i).join(', ')).toBe('');
});

describe('S32: who is let in where', () => {
  test.each(inRoom.map((one) => [one.name, one] as const))(
    '%s is closed to everyone it is not for',
    async (_name, one) => {
      expect((await ask(app.person(), one)).status, 'anonymous').toBe(401);
      const nowhere = await ask(stranger, one, makeId());
      for (const [who, person] of [
        ['owner of another fishroom', stranger],
        ['removed member', removed],
      ] as const) {
        const before = await rowsHash();
        const answer = await ask(person, one);
        expect(answer.status, who).toBe(404);
        expect(answer.error, `${who}: as if it had never been`).toEqual(nowhere.error);
        expect(await rowsHash(), `${who} changed nothing`).toBe(before);
      }
    },
  );

  test.each(inRoom.map((one) => [one.name, one] as const))('%s obeys the roles table', async (_name, one) => {
    const { needs } = one.line;
    if (needs === 'public' || needs === 'signedIn' || needs === 'buyer') return;
    for (const role of ROLES) {
      const before = await rowsHash();
      const { status } = await ask(people[role], one);
      if (may(role, needs)) expect([401, 403], role).not.toContain(status);
      else {
        expect(status, role).toBe(403);
        expect(await rowsHash(), `${role} changed nothing`).toBe(before);
      }
      expect(status, `${role}: never a fault of ours`).toBeLessThan(500);
    }
  });

  test.each(endpoints.filter(({ line }) => line.needs === 'signedIn').map((one) => [one.name, one] as const))(
    '%s asks for an account',
    async (_name, one) => {
      expect((await ask(app.person(), one)).status).toBe(401);
      const { status } = await ask(await personWithAccount(app), one);
      expect(status).not.toBe(401);
      expect(status).toBeLessThan(500);
    },
  );
});

describe('bad input', () => {
  const writing = inRoom.filter(({ line }) => line.method !== 'GET' && line.kind === 'json');
  test.each(writing.map((one) => [one.name, one] as const))(
    '%s names a field that nobody asked for, and never breaks',
    async (_name, one) => {
      const answer = await people.owner.ask(one.line, {
        params: paramsOf(one, roomId),
        body: { roomId: makeId(), role: 'owner', createdAt: 'x', __proto__: { isAdmin: true } },
      });
      expect([404, 422]).toContain(answer.status);
      if (answer.status === 422) expect(Object.keys(answer.body.error?.fields ?? {}).length).toBeGreaterThan(0);
    },
  );

  test.each(inRoom.filter(({ line }) => line.method === 'GET').map((one) => [one.name, one] as const))(
    '%s refuses a query it does not know',
    async (_name, one) => {
      const answer = await people.owner.ask(one.line, { params: paramsOf(one, roomId), query: { admin: '1' } });
      expect(answer.status).toBe(422);
      expect(answer.body.error?.fields).toMatchObject({ admin: expect.any(String) });
    },
  );
});
