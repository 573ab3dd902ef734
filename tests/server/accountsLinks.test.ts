import { createHash } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { getMe, signIn, signUp } from '@/shared/accounts/contract';
import {
  askPasswordReset,
  askSignInLink,
  askVerifyLetter,
  resetPassword,
  signInByLink,
  verifyEmail,
} from '@/shared/accounts/links';
import { changeEmail } from '@/shared/accounts/security';
import { GOOD_PASSWORD, lettersTo, personWithAccount, seenAs, tokenSentTo } from '../support/accounts';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeEach(async () => {
  app = await testApp({ passwordCost: 10, origin: 'https://fish.example' });
});
afterEach(() => app.close());

const EMAIL = 'tiril@mail.example';
const NEW_PASSWORD = 'a cellar full of bubbles';

async function signedUp(email = EMAIL) {
  const person = app.person();
  await person.get(signUp, { body: { name: 'Tiril Moe', email, password: GOOD_PASSWORD } });
  return person;
}

const isVerified = async (person: Awaited<ReturnType<typeof signedUp>>) =>
  (await person.get(getMe)).account.emailVerified;

describe('confirming the address', () => {
  test('the link in the letter confirms it once', async () => {
    const tiril = await signedUp();
    const token = await tokenSentTo(app, EMAIL);
    expect(await app.person().get(verifyEmail, { body: { token } })).toEqual({ ok: true, email: EMAIL });
    expect(await isVerified(tiril)).toBe(true);
    expect((await app.person().ask(verifyEmail, { body: { token } })).status).toBe(422);
    expect((await tiril.ask(askVerifyLetter)).status).toBe(409);
  });

  test('opening the link’s page changes nothing: a mail scanner may', async () => {
    const tiril = await signedUp();
    const [letter] = await lettersTo(app, EMAIL);
    const link = new URL(/https:\/\/\S+/.exec(letter?.text ?? '')?.[0] ?? '');
    expect([link.origin, link.pathname]).toEqual(['https://fish.example', '/verify']);
    await app.person().raw('GET', link.pathname + link.hash);
    await app.person().raw('GET', `/api/verified-addresses?token=${link.hash.slice(1)}`);
    expect(await isVerified(tiril)).toBe(false);
  });

  test('another letter can be asked for; the link of the first is dead then, and a day later the second too', async () => {
    const tiril = await signedUp();
    const first = await tokenSentTo(app, EMAIL);
    await tiril.get(askVerifyLetter);
    const second = await tokenSentTo(app, EMAIL);
    expect(second).not.toBe(first);
    expect((await app.person().ask(verifyEmail, { body: { token: first } })).status).toBe(422);
    app.later({ minutes: 24 * 60 + 1 });
    expect((await app.person().ask(verifyEmail, { body: { token: second } })).status).toBe(422);
    expect(await isVerified(tiril)).toBe(false);
  });
});

describe('a sign-in link', () => {
  test('signs in once, within a quarter of an hour', async () => {
    const known = await personWithAccount(app, { email: EMAIL });
    known.cookie = '';
    expect((await app.person().ask(askSignInLink, { body: { email: EMAIL } })).status).toBe(202);
    const token = await tokenSentTo(app, EMAIL);
    const browser = app.person();
    await browser.get(signInByLink, { body: { token } });
    expect(await seenAs(browser)).toBe(EMAIL);
    expect((await app.person().ask(signInByLink, { body: { token } })).status).toBe(422);
    await app.person().get(askSignInLink, { body: { email: EMAIL } });
    const late = await tokenSentTo(app, EMAIL);
    app.later({ minutes: 16 });
    expect((await app.person().ask(signInByLink, { body: { token: late } })).status).toBe(422);
  });

  test('S22 a link for another purpose, or a session’s token, signs nobody in', async () => {
    await signedUp();
    const verify = await tokenSentTo(app, EMAIL);
    expect((await app.person().ask(signInByLink, { body: { token: verify } })).status).toBe(422);
    expect((await app.person().ask(resetPassword, { body: { token: verify, password: NEW_PASSWORD } })).status).toBe(
      422,
    );
  });

  test('for an address nobody confirmed, whoever reads its post chooses a password: who typed the first one is out', async () => {
    const squatter = await signedUp();
    await app.person().get(askSignInLink, { body: { email: EMAIL } });
    const letters = await lettersTo(app, EMAIL);
    expect(letters.map(({ subject }) => subject)).toEqual(['Confirm your address', 'Choose a new password']);
    await app.person().get(resetPassword, { body: { token: await tokenSentTo(app, EMAIL), password: NEW_PASSWORD } });
    expect(await seenAs(squatter)).toBeNull();
    expect((await app.person().ask(signIn, { body: { email: EMAIL, password: GOOD_PASSWORD } })).status).toBe(401);
  });
});

describe('S63 a forgotten password', () => {
  test('a known and an unknown address are answered alike, in the same time', async () => {
    await signedUp();
    const time = async (email: string) => {
      const started = performance.now();
      const { status, body } = await app.person().ask(askPasswordReset, { body: { email } });
      return { status, body, took: performance.now() - started };
    };
    await time('warm@mail.example');
    const known: Awaited<ReturnType<typeof time>>[] = [];
    const unknown: typeof known = [];
    for (let i = 0; i < 5; i += 1) {
      known.push(await time(EMAIL));
      unknown.push(await time(`nobody${i}@mail.example`));
    }
    for (const { status, body } of [...known, ...unknown]) expect([status, body]).toEqual([202, { ok: true }]);
    const median = (list: typeof known) => list.map(({ took }) => took).sort((a, b) => a - b)[2] ?? 0;
    // Both write one row in one transaction; the letter's own row is a fraction of that.
    expect(Math.abs(median(known) - median(unknown))).toBeLessThan(15);
    expect(await lettersTo(app, 'nobody0@mail.example')).toEqual([]);
  });

  test('the link sets a new password once, and ends every session of the account', async () => {
    const tiril = await signedUp();
    const phone = app.person();
    await phone.get(signIn, { body: { email: EMAIL, password: GOOD_PASSWORD } });
    await app.person().get(askPasswordReset, { body: { email: EMAIL } });
    const token = await tokenSentTo(app, EMAIL);
    const common = await app.person().ask(resetPassword, { body: { token, password: 'password123' } });
    expect([common.status, Object.keys(common.body.error?.fields ?? {})]).toEqual([422, ['password']]);
    await app.person().get(resetPassword, { body: { token, password: NEW_PASSWORD } });
    expect([await seenAs(tiril), await seenAs(phone)]).toEqual([null, null]);
    expect((await app.person().ask(resetPassword, { body: { token, password: 'and once more' } })).status).toBe(422);
    await app.person().get(signIn, { body: { email: EMAIL, password: NEW_PASSWORD } });
    expect((await lettersTo(app, EMAIL)).at(-1)?.subject).toBe('Your password was changed');
  });

  test('it is dead after an hour, and when a newer one was asked for', async () => {
    await signedUp();
    await app.person().get(askPasswordReset, { body: { email: EMAIL } });
    const first = await tokenSentTo(app, EMAIL);
    await app.person().get(askPasswordReset, { body: { email: EMAIL } });
    const second = await tokenSentTo(app, EMAIL);
    expect((await app.person().ask(resetPassword, { body: { token: first, password: NEW_PASSWORD } })).status).toBe(
      422,
    );
    app.later({ minutes: 61 });
    expect((await app.person().ask(resetPassword, { body: { token: second, password: NEW_PASSWORD } })).status).toBe(
      422,
    );
    await app.person().get(signIn, { body: { email: EMAIL, password: GOOD_PASSWORD } });
  });

  test('two who use one link at once: one of them sets the password', async () => {
    await signedUp();
    await app.person().get(askPasswordReset, { body: { email: EMAIL } });
    const token = await tokenSentTo(app, EMAIL);
    const passwords = ['first of the two to come', 'second of the two to come', 'third who came as well'];
    const answers = await Promise.all(
      passwords.map((password) => app.person().ask(resetPassword, { body: { token, password } })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 422, 422]);
  });

  test('its address comes from the settings, never from the request', async () => {
    await signedUp();
    await app.person().ask(askPasswordReset, {
      body: { email: EMAIL },
      headers: { 'x-forwarded-host': 'evil.test', 'x-forwarded-proto': 'https', forwarded: 'host=evil.test' },
    });
    const letter = (await lettersTo(app, EMAIL)).at(-1);
    expect(letter?.text).toContain('https://fish.example/reset#');
    expect(`${letter?.text} ${letter?.html}`).not.toContain('evil.test');
  });

  test('the data file holds the token’s SHA-256, and the token nowhere: not in the outbox either', async () => {
    await signedUp();
    await app.person().get(askPasswordReset, { body: { email: EMAIL } });
    const before = JSON.stringify(await app.house.db.selectFrom('letter').selectAll().execute());
    const token = await tokenSentTo(app, EMAIL);
    const rows = await app.house.db.selectFrom('mailToken').selectAll().execute();
    const after = JSON.stringify(await app.house.db.selectFrom('letter').selectAll().execute());
    expect(rows.map(({ tokenHash }) => tokenHash)).toContain(createHash('sha256').update(token).digest('hex'));
    expect(`${before}${after}${JSON.stringify(rows)}`).not.toContain(token);
  });

  test('seven letters to one address within the hour are too many', async () => {
    const statuses = [];
    for (let i = 0; i < 7; i += 1)
      statuses.push((await app.person().ask(askPasswordReset, { body: { email: EMAIL } })).status);
    expect(statuses).toEqual([202, 202, 202, 202, 202, 202, 429]);
  });

  test('S12 an account closed by hand gets no letter and uses no link', async () => {
    await signedUp();
    await app.person().get(askPasswordReset, { body: { email: EMAIL } });
    const token = await tokenSentTo(app, EMAIL);
    await app.house.db.updateTable('account').set({ disabledAt: '2026-05-14T09:12:00.000Z' }).execute();
    const sent = (await lettersTo(app, EMAIL)).length;
    expect((await app.person().ask(askSignInLink, { body: { email: EMAIL } })).status).toBe(202);
    expect((await lettersTo(app, EMAIL)).length).toBe(sent);
    expect((await app.person().ask(resetPassword, { body: { token, password: NEW_PASSWORD } })).status).toBe(422);
  });
});

describe('changing the address', () => {
  test('the new one is proved by its letter, the old one is told, and nothing changes before', async () => {
    const tiril = await signedUp();
    await tiril.get(changeEmail, { body: { current: GOOD_PASSWORD, email: 'New@mail.example' } });
    expect(await seenAs(tiril)).toBe(EMAIL);
    const token = await tokenSentTo(app, 'New@mail.example');
    await app.person().get(verifyEmail, { body: { token } });
    expect((await tiril.get(getMe)).account).toMatchObject({ email: 'New@mail.example', emailVerified: true });
    await app.person().get(signIn, { body: { email: 'new@mail.example', password: GOOD_PASSWORD } });
    const told = (await lettersTo(app, EMAIL)).map(({ subject }) => subject);
    expect(told.slice(-2)).toEqual(['A new address was asked for', 'Your address was changed']);
  });

  test('an address that somebody else has is refused to whoever reads its post, and said to nobody else', async () => {
    const tiril = await signedUp();
    await personWithAccount(app, { email: 'taken@mail.example' });
    expect(
      (await tiril.ask(changeEmail, { body: { current: GOOD_PASSWORD, email: 'taken@mail.example' } })).status,
    ).toBe(200);
    const token = await tokenSentTo(app, 'taken@mail.example');
    expect((await app.person().ask(verifyEmail, { body: { token } })).status).toBe(409);
    expect(await seenAs(tiril)).toBe(EMAIL);
  });

  test('the letter of the first address does not confirm the second', async () => {
    const tiril = await signedUp();
    const first = await tokenSentTo(app, EMAIL);
    await tiril.get(changeEmail, { body: { current: GOOD_PASSWORD, email: 'new@mail.example' } });
    await app.person().get(verifyEmail, { body: { token: await tokenSentTo(app, 'new@mail.example') } });
    expect((await app.person().ask(verifyEmail, { body: { token: first } })).status).toBe(422);
  });
});
