import { createHmac, generateKeyPairSync, randomUUID } from 'node:crypto';
import { decodeJwt, SignJWT } from 'jose';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sweepAccounts } from '@/server/accounts/sweep';
import { getMe, signIn, signOut, signUp } from '@/shared/accounts/contract';
import { changePassword, endOneSession, endOtherSessions, listSessions } from '@/shared/accounts/security';
import { changeRole } from '@/shared/members/contract';
import { changeRoom, createRoom, getRoom } from '@/shared/rooms/contract';
import { METRIC } from '@/shared/units';
import { cookieFor, GOOD_PASSWORD, memberOf, ownerWithRoom, personWithAccount, seenAs } from '../support/accounts';
import { type Person, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await testApp({ passwordCost: 10 });
});
afterAll(() => app.close());

let count = 0;
async function signedUp() {
  count += 1;
  const email = `keeper${count}@mail.example`;
  const person = app.person();
  await person.get(signUp, { body: { name: 'Joar Lie', email, password: GOOD_PASSWORD } });
  return { person, email };
}

async function signedIn(email: string): Promise<Person> {
  const person = app.person();
  await person.get(signIn, { body: { email, password: GOOD_PASSWORD } });
  return person;
}

const statusWith = async (cookie: string) => {
  const person = app.person();
  person.cookie = cookie;
  return (await person.ask(getMe)).status;
};

describe('the cookie', () => {
  test('S13 is __Host-, Secure, HttpOnly, SameSite, for the whole site, and its token is in no body', async () => {
    const { email } = await signedUp();
    const body = JSON.stringify({ email, password: GOOD_PASSWORD });
    const answer = await app
      .person()
      .raw('POST', '/api/sessions', { body, headers: { 'content-type': 'application/json' } });
    const [cookie = ''] = answer.headers.getSetCookie();
    expect(answer.headers.getSetCookie()).toHaveLength(1);
    expect(cookie).toMatch(/^__Host-kinwater=[\w-]+\.[\w-]+\.[\w-]+;/);
    for (const part of ['; Secure', '; HttpOnly', '; Path=/', '; SameSite=Lax']) expect(cookie).toContain(part);
    expect(cookie).not.toContain('Domain');
    expect(await answer.text()).toBe('{"ok":true,"secondStep":false}');
  });

  test('S14 signing in with an old cookie gives a new one, and the old one is dead', async () => {
    const { person, email } = await signedUp();
    const old = person.cookie;
    await person.get(signIn, { body: { email, password: GOOD_PASSWORD } });
    expect(person.cookie).not.toBe(old);
    expect([await statusWith(old), await statusWith(person.cookie)]).toEqual([401, 200]);
  });

  test('S15 S25 after signing out it is worth nothing, and the browser is told to forget what it fetched', async () => {
    const { person } = await signedUp();
    const { cookie } = person;
    const answer = await person.ask(signOut);
    expect(answer.headers.get('clear-site-data')).toBe('"cache", "storage"');
    expect(person.cookie).toBe('');
    expect(await statusWith(cookie)).toBe(401);
    expect((await app.person().ask(signOut)).status).toBe(200);
  });

  test('S16 a new password, or a closed account, ends every other sign-in at once', async () => {
    const { person, email } = await signedUp();
    const phone = await signedIn(email);
    await person.get(changePassword, { body: { current: GOOD_PASSWORD, password: 'a new phrase for the rack' } });
    expect([await seenAs(phone), await seenAs(person)]).toEqual([null, email]);
    await app.house.db
      .updateTable('account')
      .set({ disabledAt: app.house.clock.now().toISOString() })
      .where('email', '=', email)
      .execute();
    expect(await seenAs(person)).toBeNull();
    const again = await app.person().ask(signIn, { body: { email, password: 'a new phrase for the rack' } });
    expect(again.status).toBe(401);
  });

  test('S17 a device that lay in a drawer for a month is signed out; one in use stays in for 120 days, not longer', async () => {
    const own = await testApp();
    try {
      const drawer = await personWithAccount(own);
      const used = await personWithAccount(own);
      for (let day = 10; day <= 110; day += 10) {
        own.later({ days: 10 });
        expect(await seenAs(used), `day ${day}`).toBe(used.email);
        if (day === 30) expect(await seenAs(drawer)).toBeNull();
      }
      own.later({ days: 11 });
      expect(await seenAs(used)).toBeNull();
    } finally {
      await own.close();
    }
  });
});

describe('the list of sign-ins', () => {
  test('S18 names the devices, and ends one or all others; a stranger cannot end it', async () => {
    const { person, email } = await signedUp();
    const phone = app.person();
    const userAgent = 'Mozilla/5.0 (Linux; Android 14) AppleWebKit/537.36 Chrome/126.0 Mobile Safari/537.36';
    await phone.ask(signIn, { body: { email, password: GOOD_PASSWORD }, headers: { 'user-agent': userAgent } });
    const tablet = await signedIn(email);
    const { sessions } = await person.get(listSessions);
    expect(sessions).toHaveLength(3);
    expect(sessions.filter(({ current }) => current)).toHaveLength(1);
    const onPhone = sessions.find(({ device }) => device === 'Chrome on Android');
    const params = { sessionId: onPhone?.id };
    const stranger = await personWithAccount(app);
    expect((await stranger.ask(endOneSession, { params })).status).toBe(404);
    await person.get(endOneSession, { params });
    expect([await seenAs(phone), await seenAs(tablet), await seenAs(person)]).toEqual([null, email, email]);
    expect((await person.ask(endOneSession, { params })).status).toBe(404);
    await person.get(endOtherSessions);
    expect([await seenAs(tablet), await seenAs(person)]).toEqual([null, email]);
  });
});

const encode = (part: unknown) => Buffer.from(JSON.stringify(part)).toString('base64url');

/** A token signed by hand with the installation's own secret, but for what a test changes. */
function forged(header: Record<string, unknown>, payload: Record<string, unknown>, secret: string): string {
  const head = `${encode(header)}.${encode(payload)}`;
  return `__Host-kinwater=${head}.${createHmac('sha256', secret).update(head).digest('base64url')}`;
}

describe('tokens that were not made here', () => {
  const HEADER = { alg: 'HS256', typ: 'kinwater-session' };
  let payload: Record<string, unknown>;
  let secret: string;
  beforeAll(async () => {
    const known = await personWithAccount(app);
    payload = decodeJwt(known.cookie.slice('__Host-kinwater='.length));
    secret = app.house.config.secret;
  });

  test('the same token made by hand is taken: the ones below fail for what is changed in them', async () => {
    expect(await statusWith(forged(HEADER, payload, secret))).toBe(200);
  });

  test('S19 unsigned, signed by another key, signed as RSA, or with another payload', async () => {
    const none = `__Host-kinwater=${encode({ ...HEADER, alg: 'none' })}.${encode(payload)}.`;
    expect(await statusWith(none)).toBe(401);
    expect(await statusWith(forged(HEADER, payload, 'another secret of more than thirty-two letters'))).toBe(401);
    const { privateKey, publicKey } = generateKeyPairSync('rsa', { modulusLength: 2048 });
    const rsa = await new SignJWT(payload).setProtectedHeader({ ...HEADER, alg: 'RS256' }).sign(privateKey);
    expect(await statusWith(`__Host-kinwater=${rsa}`)).toBe(401);
    const pem = publicKey.export({ type: 'spki', format: 'pem' }).toString();
    expect(await statusWith(forged(HEADER, payload, pem))).toBe(401);
    const [head = '', , signature = ''] = forged(HEADER, payload, secret).split('.');
    expect(await statusWith(`${head}.${encode({ ...payload, sub: randomUUID() })}.${signature}`)).toBe(401);
  });

  test.each([
    ['jku', 'http://127.0.0.1:9/keys'],
    ['jwk', { kty: 'oct', k: 'AAAA' }],
    ['x5u', 'http://127.0.0.1:9/cert'],
    ['kid', '../../dev/null'],
  ])('S20 a %s in the header moves nothing: the key is ours alone', async (name, value) => {
    expect(await statusWith(forged({ ...HEADER, [name]: value }, payload, 'AAAA'))).toBe(401);
  });

  test('S21 past its end, before its beginning, or without an end', async () => {
    const seconds = Math.floor(app.house.clock.now().getTime() / 1000);
    const { exp: _exp, ...endless } = payload;
    expect(await statusWith(forged(HEADER, { ...payload, exp: seconds - 1 }, secret))).toBe(401);
    expect(await statusWith(forged(HEADER, { ...payload, nbf: seconds + 3600 }, secret))).toBe(401);
    expect(await statusWith(forged(HEADER, endless, secret))).toBe(401);
  });

  test('S22 of another kind, or for another service', async () => {
    expect(await statusWith(forged({ ...HEADER, typ: 'kinwater-link' }, payload, secret))).toBe(401);
    expect(await statusWith(forged({ alg: 'HS256' }, payload, secret))).toBe(401);
    expect(await statusWith(forged(HEADER, { ...payload, aud: 'elsewhere' }, secret))).toBe(401);
  });

  test('S24 in the address or in another header it is no session', async () => {
    const known = await personWithAccount(app);
    const token = known.cookie.slice('__Host-kinwater='.length);
    const nobody = app.person();
    for (const query of [`token=${token}`, `session=${token}`, `__Host-kinwater=${token}`])
      expect((await nobody.raw('GET', `/api/me?${query}`)).status).toBe(401);
    expect((await nobody.raw('GET', '/api/me', { headers: { authorization: `Bearer ${token}` } })).status).toBe(401);
  });

  test('a token signed with the previous secret is still good after the secret was changed', async () => {
    const known = await personWithAccount(app);
    const { db, config } = app.house;
    const later = await testApp({
      secret: 'a later secret of more than thirty-two letters',
      previousSecret: config.secret,
    });
    try {
      const account = await db.selectFrom('account').where('id', '=', known.id).selectAll().executeTakeFirstOrThrow();
      const sessions = await db.selectFrom('session').where('accountId', '=', known.id).selectAll().execute();
      await later.house.db.insertInto('account').values(account).execute();
      await later.house.db.insertInto('session').values(sessions).execute();
      const same = later.person();
      same.cookie = known.cookie;
      expect(await seenAs(same)).toBe(known.email);
    } finally {
      await later.close();
    }
  });
});

describe('requests from elsewhere', () => {
  const room = { name: 'Planted', place: null, timeZone: 'UTC', currency: 'EUR', units: METRIC };
  const roomsOf = async (person: Person) => (await person.get(getMe)).rooms.length;

  test.each([
    [{ origin: 'https://evil.test', 'sec-fetch-site': 'cross-site' }],
    [{ origin: 'https://evil.test' }],
    [{ 'sec-fetch-site': 'same-site' }],
    [{ origin: 'null' }],
  ])('S27 a write with the cookie and %j is refused and does nothing', async (headers) => {
    const person = await personWithAccount(app);
    expect((await person.ask(createRoom, { body: room, headers })).status).toBe(403);
    expect(await roomsOf(person)).toBe(0);
  });

  test('S27 from our own pages it is taken', async () => {
    const person = await personWithAccount(app);
    const headers = { origin: app.origin, 'sec-fetch-site': 'same-origin' };
    expect((await person.ask(createRoom, { body: room, headers })).status).toBe(200);
  });

  test.each(['text/plain', 'application/x-www-form-urlencoded', 'application/json-patch+json'])(
    'S28 a body as %s is refused: such a form needs no asking before it is sent',
    async (type) => {
      const person = await personWithAccount(app);
      const answer = await person.raw('POST', '/api/rooms', {
        body: JSON.stringify(room),
        headers: { 'content-type': type },
      });
      expect(answer.status).toBe(415);
      expect(await roomsOf(person)).toBe(0);
    },
  );

  test('S29 reading an address that writes does nothing, and no header turns one verb into another', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const got = await owner.raw('GET', '/api/rooms');
    expect([got.status, got.headers.get('allow')]).toEqual([405, 'POST']);
    expect((await owner.raw('HEAD', '/api/sessions/current')).status).toBe(405);
    await owner.raw('GET', `/api/rooms/${roomId}`, { headers: { 'x-http-method-override': 'DELETE' } });
    await owner.raw('POST', '/api/sessions/current', { headers: { 'x-http-method-override': 'DELETE' } });
    expect(await roomsOf(owner)).toBe(1);
  });

  test.each(['https://evil.test', 'null'])('S30 %s is let in by no header', async (origin) => {
    const person = await personWithAccount(app);
    for (const method of ['OPTIONS', 'GET']) {
      const answer = await person.raw(method, '/api/me', { headers: { origin } });
      expect(answer.headers.get('access-control-allow-origin')).toBeNull();
      expect(answer.headers.get('access-control-allow-credentials')).toBeNull();
    }
  });

  test('S31 there is no bearer: a request with both is judged by its cookie', async () => {
    const person = await personWithAccount(app);
    const headers = { authorization: 'Bearer nothing', origin: 'https://evil.test' };
    expect((await person.ask(createRoom, { body: room, headers })).status).toBe(403);
  });
});

describe('the role', () => {
  test('S41 is judged anew at every request: the next one after a demotion is refused', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const second = await memberOf(app, roomId, 'owner');
    const { slug } = await second.get(getRoom, { params: { roomId } });
    const change = { name: 'By the second', place: null, timeZone: 'UTC', currency: 'EUR', units: METRIC, slug };
    await second.get(changeRoom, { params: { roomId }, body: { ...change, version: 1 } });
    await owner.get(changeRole, { params: { roomId, accountId: second.id }, body: { role: 'viewer', version: 1 } });
    const after = await second.ask(changeRoom, { params: { roomId }, body: { ...change, version: 2 } });
    expect(after.status).toBe(403);
  });

  test('a session of an account that is gone is nobody’s', async () => {
    expect(await statusWith(await cookieFor(app, (await personWithAccount(app)).id))).toBe(200);
    expect(await statusWith('__Host-kinwater=garbage')).toBe(401);
  });
});

test('what is over is swept away after a month; a sign-in that is used, and its account, stay', async () => {
  const own = await testApp();
  try {
    const ended = await personWithAccount(own);
    const used = await personWithAccount(own);
    await ended.get(signOut);
    own.later({ days: 20 });
    expect(await seenAs(used)).toBe(used.email);
    own.later({ days: 11 });
    await sweepAccounts(own.house);
    const { db } = own.house;
    const left = await db.selectFrom('session').select('accountId').execute();
    expect(left.map(({ accountId }) => accountId)).toEqual([used.id]);
    expect(await seenAs(used)).toBe(used.email);
    expect(await db.selectFrom('account').select('id').execute()).toHaveLength(2);
  } finally {
    await own.close();
  }
});
