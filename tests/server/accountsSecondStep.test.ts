import { generate } from 'otplib';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { signIn, signUp } from '@/shared/accounts/contract';
import { askPasswordReset, askSignInLink, resetPassword, signInByLink, verifyEmail } from '@/shared/accounts/links';
import {
  passSecondStep,
  renewRecoveryCodes,
  startSecondStep,
  turnOffSecondStep,
  turnOnSecondStep,
} from '@/shared/accounts/security';
import { GOOD_PASSWORD, lettersTo, seenAs, tokenSentTo } from '../support/accounts';
import { type Person, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeEach(async () => {
  app = await testApp({ passwordCost: 10 });
});
afterEach(() => app.close());

const EMAIL = 'sunniva@mail.example';
const codeNow = (secret: string) => generate({ secret, epoch: Math.floor(app.house.clock.now().getTime() / 1000) });

/** An account with the second step on, and the clock past the code that turned it on. */
async function withSecondStep() {
  const person = app.person();
  await person.get(signUp, { body: { name: 'Sunniva', email: EMAIL, password: GOOD_PASSWORD } });
  await app.person().get(verifyEmail, { body: { token: await tokenSentTo(app, EMAIL) } });
  const { secret, address } = await person.get(startSecondStep, { body: { current: GOOD_PASSWORD } });
  const { recoveryCodes } = await person.get(turnOnSecondStep, { body: { code: await codeNow(secret) } });
  app.later({ minutes: 2 });
  return { person, secret, address, recoveryCodes };
}

async function passwordOnly(): Promise<Person> {
  const person = app.person();
  expect(await person.get(signIn, { body: { email: EMAIL, password: GOOD_PASSWORD } })).toEqual({
    ok: true,
    secondStep: true,
  });
  return person;
}

test('S11 a password alone opens nothing; with the code it does', async () => {
  const { secret, address } = await withSecondStep();
  expect(address).toMatch(/^otpauth:\/\/totp\/Kinwater:sunniva/);
  const person = await passwordOnly();
  expect(await seenAs(person)).toBeNull();
  const half = person.cookie;
  await person.get(passSecondStep, { body: { code: await codeNow(secret) } });
  expect(await seenAs(person)).toBe(EMAIL);
  // The cookie of the first step is not the one that was let in.
  const replay = app.person();
  replay.cookie = half;
  expect(await seenAs(replay)).toBeNull();
});

test('S11 a code works once, and an earlier one not after it', async () => {
  const { secret } = await withSecondStep();
  const code = await codeNow(secret);
  await (await passwordOnly()).get(passSecondStep, { body: { code } });
  const again = await (await passwordOnly()).ask(passSecondStep, { body: { code } });
  expect([again.status, again.body.error?.fields]).toEqual([401, { code: 'That code is not right' }]);
});

test('S11 two devices with one code at once: one is let in', async () => {
  const { secret } = await withSecondStep();
  const code = await codeNow(secret);
  const devices = [await passwordOnly(), await passwordOnly(), await passwordOnly()];
  const answers = await Promise.all(devices.map((device) => device.ask(passSecondStep, { body: { code } })));
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 401, 401]);
});

test('S11 thirty-one wrong codes are too many, and then the right one is as well', async () => {
  const { secret } = await withSecondStep();
  const person = await passwordOnly();
  const statuses = [];
  for (let i = 0; i < 31; i += 1)
    statuses.push((await person.ask(passSecondStep, { body: { code: '000000' } })).status);
  expect(statuses.indexOf(429)).toBe(10);
  expect((await person.ask(passSecondStep, { body: { code: await codeNow(secret) } })).status).toBe(429);
});

test('a code of half a minute ago is still good, one of two minutes ago is not', async () => {
  const { secret } = await withSecondStep();
  const code = await codeNow(secret);
  app.later({ minutes: 0.5 });
  await (await passwordOnly()).get(passSecondStep, { body: { code } });
  const old = await codeNow(secret);
  app.later({ minutes: 2 });
  expect((await (await passwordOnly()).ask(passSecondStep, { body: { code: old } })).status).toBe(401);
});

test('a recovery code stands in for the authenticator, once, however it is typed', async () => {
  const { recoveryCodes } = await withSecondStep();
  expect(recoveryCodes).toHaveLength(10);
  const code = recoveryCodes[3] ?? '';
  await (await passwordOnly()).get(passSecondStep, { body: { code: code.toUpperCase().replaceAll('-', '') } });
  expect((await (await passwordOnly()).ask(passSecondStep, { body: { code } })).status).toBe(401);
});

test('a sign-in link and a new password ask for the second step too', async () => {
  await withSecondStep();
  await app.person().get(askSignInLink, { body: { email: EMAIL } });
  const byLink = app.person();
  await byLink.get(signInByLink, { body: { token: await tokenSentTo(app, EMAIL) } });
  expect(await seenAs(byLink)).toBeNull();
  await app.person().get(askPasswordReset, { body: { email: EMAIL } });
  const password = 'other words for the tank';
  const reset = app.person();
  await reset.get(resetPassword, { body: { token: await tokenSentTo(app, EMAIL), password } });
  expect(await seenAs(reset)).toBeNull();
  expect(await reset.get(signIn, { body: { email: EMAIL, password } })).toEqual({ ok: true, secondStep: true });
});

test('a right password waits ten minutes for its code', async () => {
  const { secret } = await withSecondStep();
  const person = await passwordOnly();
  app.later({ minutes: 11 });
  expect((await person.ask(passSecondStep, { body: { code: await codeNow(secret) } })).status).toBe(401);
});

test('a secret that was only proposed is not in force, and the data file does not show it', async () => {
  const person = app.person();
  await person.get(signUp, { body: { name: 'Sunniva', email: EMAIL, password: GOOD_PASSWORD } });
  expect((await person.ask(startSecondStep, { body: { current: 'not my password' } })).status).toBe(403);
  const { secret } = await person.get(startSecondStep, { body: { current: GOOD_PASSWORD } });
  expect((await person.ask(turnOnSecondStep, { body: { code: '000000' } })).status).toBe(403);
  expect(await app.person().get(signIn, { body: { email: EMAIL, password: GOOD_PASSWORD } })).toEqual({
    ok: true,
    secondStep: false,
  });
  expect(JSON.stringify(await app.house.db.selectFrom('account').selectAll().execute())).not.toContain(secret);
});

test('turning it off, or new recovery codes, need a code; the earlier codes are dead then', async () => {
  const { person, secret, recoveryCodes } = await withSecondStep();
  expect((await person.ask(turnOffSecondStep, { body: { code: '123456' } })).status).toBe(403);
  const renewed = await person.get(renewRecoveryCodes, { body: { code: recoveryCodes[0] } });
  expect((await person.ask(turnOffSecondStep, { body: { code: recoveryCodes[1] } })).status).toBe(403);
  expect(renewed.recoveryCodes).not.toContain(recoveryCodes[1]);
  await person.get(turnOffSecondStep, { body: { code: await codeNow(secret) } });
  expect(await app.person().get(signIn, { body: { email: EMAIL, password: GOOD_PASSWORD } })).toEqual({
    ok: true,
    secondStep: false,
  });
  expect((await lettersTo(app, EMAIL)).at(-1)?.subject).toBe('The second step was turned off');
});
