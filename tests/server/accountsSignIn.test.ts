import { afterEach, beforeEach, expect, test } from 'vitest';
import { signIn, signUp } from '@/shared/accounts/contract';
import { GOOD_PASSWORD } from '../support/accounts';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeEach(async () => {
  app = await testApp({ passwordCost: 12 });
});
afterEach(() => app.close());

const WRONG = 'certainly not this one';

async function account(email: string) {
  await app.person().get(signUp, { body: { name: 'Tordis', email, password: GOOD_PASSWORD } });
  return email;
}

const attempt = (email: string, password: string, headers: Record<string, string> = {}) =>
  app.person().ask(signIn, { body: { email, password }, headers });

test('S07 thirty wrong passwords: refused for a while, the right one too, with when to try again; others still sign in', async () => {
  const email = await account('tordis@mail.example');
  const other = await account('other@mail.example');
  const statuses: number[] = [];
  for (let i = 0; i < 30; i += 1) statuses.push((await attempt(email, WRONG)).status);
  expect(statuses.indexOf(429)).toBe(20);
  expect(new Set(statuses.slice(20))).toEqual(new Set([429]));
  const right = await attempt(email.toUpperCase(), GOOD_PASSWORD);
  expect(right.status).toBe(429);
  const wait = Number(right.headers.get('retry-after'));
  expect(wait).toBeGreaterThan(60);
  expect(wait).toBeLessThanOrEqual(15 * 60);
  expect((await attempt(other, GOOD_PASSWORD)).status).toBe(200);
});

test('S57 thirty made-up addresses in X-Forwarded-For do not reset the count', async () => {
  const email = await account('tordis@mail.example');
  const statuses: number[] = [];
  for (let i = 0; i < 30; i += 1)
    statuses.push(
      (await attempt(email, WRONG, { 'x-forwarded-for': `203.0.113.${i}`, 'x-real-ip': `203.0.113.${i}` })).status,
    );
  expect(statuses.filter((status) => status === 429)).toHaveLength(10);
});

test('S57 one address that tries many accounts is stopped as well, whatever it says of itself', async () => {
  const statuses: number[] = [];
  for (let i = 0; i < 104; i += 1) {
    const headers = { forwarded: `for=203.0.113.${i}`, 'x-forwarded-for': `203.0.113.${i}` };
    statuses.push((await attempt(`guess${i}@mail.example`, WRONG, headers)).status);
  }
  expect(statuses.indexOf(429)).toBe(100);
});

test('signing in rightly thirty times is nobody’s fault', async () => {
  const email = await account('tordis@mail.example');
  const statuses = [];
  for (let i = 0; i < 30; i += 1) statuses.push((await attempt(email, GOOD_PASSWORD)).status);
  expect(new Set(statuses)).toEqual(new Set([200]));
});

test('S08 an address nobody has is answered like a wrong password, word for word and in the same time', async () => {
  const own = await testApp({ passwordCost: 14 });
  try {
    const time = async (email: string) => {
      const started = performance.now();
      const { status, body } = await own.person().ask(signIn, { body: { email, password: WRONG } });
      return { took: performance.now() - started, status, error: { ...body.error, requestId: '' } };
    };
    const known: Awaited<ReturnType<typeof time>>[] = [];
    const unknown: typeof known = [];
    // Thirty tries each, over accounts enough that no limit is met.
    for (let i = 0; i < 5; i += 1)
      await own
        .person()
        .get(signUp, { body: { name: 'Tordis', email: `t${i}@mail.example`, password: GOOD_PASSWORD } });
    for (let i = 0; i < 30; i += 1) {
      known.push(await time(`t${i % 5}@mail.example`));
      unknown.push(await time(`nobody${i}@mail.example`));
    }
    expect(known[0]?.status).toBe(401);
    for (const answer of [...known, ...unknown]) {
      expect({ ...answer, took: 0 }).toEqual({ ...known[0], took: 0 });
    }
    const median = (list: typeof known) => list.map(({ took }) => took).sort((a, b) => a - b)[15] ?? 0;
    expect(median(unknown) / median(known)).toBeGreaterThan(0.8);
    expect(median(unknown) / median(known)).toBeLessThan(1.25);
  } finally {
    await own.close();
  }
});

test('S09 there is no account that nobody made', async () => {
  for (const [email, password] of [
    ['admin@localhost.example', 'admin'],
    ['admin@kinwater.example', 'admin'],
  ])
    expect((await attempt(email ?? '', password ?? '')).status).toBe(401);
  const names = await app.person().ask(signIn, { body: { email: 'admin', password: 'admin' } });
  expect(names.status).toBe(422);
});

test('an account closed by hand is answered like a wrong password', async () => {
  const email = await account('tordis@mail.example');
  const wrong = await attempt(email, WRONG);
  await app.house.db.updateTable('account').set({ disabledAt: '2026-05-14T09:12:00.000Z' }).execute();
  const closed = await attempt(email, GOOD_PASSWORD);
  expect([closed.status, closed.body.error?.message]).toEqual([wrong.status, wrong.body.error?.message]);
});
