import { Writable } from 'node:stream';
import pino from 'pino';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { sendWaiting } from '@/server/mail/outbox';
import { writeLetter } from '@/server/mail/writeLetter';
import { signIn, signUp } from '@/shared/accounts/contract';
import { inviteMember, listMembers } from '@/shared/members/contract';
import { changeRoom } from '@/shared/rooms/contract';
import { METRIC } from '@/shared/units';
import { GOOD_PASSWORD, lettersTo, memberOf, ownerWithRoom, tokenSentTo } from '../support/accounts';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeEach(async () => {
  app = await testApp({ passwordCost: 10 });
});
afterEach(() => app.close());

const now = () => app.house.clock.now().toISOString();
const asked = () => ({ db: app.house.db, now: now() });
const letterRow = () => app.house.db.selectFrom('letter').selectAll().executeTakeFirstOrThrow();
const draft = { kind: 'test', to: 'astri@mail.example', subject: 'Fish are ready', paragraphs: ['Six at 5 cm.'] };

/** A mail server that refuses, for good or for now. */
function mailFails(responseCode?: number) {
  const { mailer } = app.house;
  const working = mailer.send;
  mailer.send = () => Promise.reject(Object.assign(new Error('mailbox trouble'), responseCode ? { responseCode } : {}));
  return () => {
    mailer.send = working;
  };
}

describe('a letter', () => {
  test('is text and HTML, with the fishroom’s name, the facts, the button, and a way to stop such letters', async () => {
    const { roomId } = await ownerWithRoom(app, { name: 'Low Shelf & Sons' });
    await writeLetter(
      { ...asked(), roomId },
      {
        ...draft,
        toName: 'Astri',
        facts: [['Fish', '6 at <5 cm>']],
        button: { label: 'See the order', url: 'https://fish.example/order?a=1&b=2' },
        stopUrl: 'https://fish.example/stop',
        attachments: [{ filename: 'sheet.txt', contentType: 'text/plain', content: 'F = 0.037' }],
      },
    );
    const [letter] = await lettersTo(app, 'astri@mail.example');
    expect(letter?.to).toContain('Astri');
    expect(letter?.text).toContain('Fish: 6 at <5 cm>');
    expect(letter?.text).toContain('From Low Shelf & Sons, which is kept in Kinwater.');
    expect(letter?.html).toContain('6 at &lt;5 cm&gt;');
    expect(letter?.html).toContain('href="https://fish.example/order?a=1&amp;b=2"');
    expect(letter?.headers['list-unsubscribe']).toBe('<https://fish.example/stop>');
    expect(letter?.attachments[0]?.content.toString()).toBe('F = 0.037');
  });

  test('S48 a name of markup or line breaks stays a name: in the subject, in the text, in the HTML', async () => {
    const { owner, roomId } = await ownerWithRoom(app, { name: '<img src=x onerror=alert(1)>' });
    await owner.get(inviteMember, { params: { roomId }, body: { email: 'guest@mail.example', role: 'viewer' } });
    const [letter] = await lettersTo(app, 'guest@mail.example');
    expect(letter?.subject).toBe(`${owner.name} invites you to <img src=x onerror=alert(1)>`);
    expect(letter?.html).not.toContain('<img');
    await writeLetter(asked(), { ...draft, subject: 'Hello\r\nBcc: everyone@mail.example', toName: 'A\r\nX-Evil: 1' });
    const [broken] = await lettersTo(app, 'astri@mail.example');
    expect(broken?.subject).toBe('Hello Bcc: everyone@mail.example');
    expect(Object.keys(broken?.headers ?? {})).not.toContain('bcc');
    expect(Object.keys(broken?.headers ?? {})).not.toContain('x-evil');
  });

  test('that is part of a save that fails is never sent', async () => {
    await expect(
      app.house.db.transaction().execute(async (db) => {
        await writeLetter({ db, now: now() }, draft);
        throw new Error('no');
      }),
    ).rejects.toThrow('no');
    expect(await lettersTo(app, draft.to)).toEqual([]);
  });
});

describe('the outbox', () => {
  test('S53 tries again, later each time, when the mail server is away; what was saved stays saved', async () => {
    const mends = mailFails();
    const { owner, roomId } = await ownerWithRoom(app);
    expect(
      (await owner.ask(inviteMember, { params: { roomId }, body: { email: draft.to, role: 'viewer' } })).status,
    ).toBe(200);
    const waits: number[] = [];
    for (let i = 0; i < 4; i += 1) {
      expect(await sendWaiting(app.house)).toBe(0);
      const { nextTryAt, state, attempts } = await letterRow();
      expect([state, attempts]).toEqual(['waiting', i + 1]);
      waits.push((Date.parse(nextTryAt) - Date.parse(now())) / 60_000);
      expect(await sendWaiting(app.house)).toBe(0);
      app.later({ minutes: waits.at(-1) ?? 0 });
    }
    expect(waits).toEqual([0.5, 1, 2, 4]);
    mends();
    expect((await lettersTo(app, draft.to)).length).toBe(1);
    expect((await letterRow()).state).toBe('sent');
    expect((await lettersTo(app, draft.to)).length).toBe(1);
  });

  test('gives up after ten tries, and the fishroom is told which invitation did not arrive', async () => {
    mailFails();
    const { owner, roomId } = await ownerWithRoom(app);
    await owner.get(inviteMember, { params: { roomId }, body: { email: draft.to, role: 'viewer' } });
    for (let i = 0; i < 10; i += 1) {
      await sendWaiting(app.house);
      app.later({ minutes: 6 * 60 });
    }
    expect(await letterRow()).toMatchObject({ state: 'failed', attempts: 10, lastError: 'mailbox trouble' });
    const { invitations } = await owner.get(listMembers, { params: { roomId } });
    expect(invitations[0]?.letterFailed).toBe(true);
  });

  test('takes a refusal for good as such: a mailbox that does not exist is not tried again', async () => {
    mailFails(550);
    await writeLetter(asked(), draft);
    await sendWaiting(app.house);
    expect(await letterRow()).toMatchObject({ state: 'failed', attempts: 1 });
  });
});

describe('the developers’ page', () => {
  test('lists the sink’s letters and shows each, its markup locked in', async () => {
    await writeLetter(asked(), { ...draft, button: { label: 'Go', url: 'https://fish.example/x' } });
    const reader = app.person();
    const list = await (await reader.raw('GET', '/dev/letters')).text();
    expect(list).toContain('<a href="/dev/letters/1">Fish are ready</a>');
    const one = await (await reader.raw('GET', '/dev/letters/1')).text();
    expect(one).toContain('<a href="https://fish.example/x">https://fish.example/x</a>');
    const html = await reader.raw('GET', '/dev/letters/1/html');
    expect(html.headers.get('content-security-policy')).toContain("default-src 'none'");
    const json = await (await reader.raw('GET', '/dev/letters.json?to=astri')).json();
    expect(json).toEqual({ letters: [expect.objectContaining({ subject: 'Fish are ready' })] });
    expect((await reader.raw('GET', '/dev/letters/99')).status).toBe(404);
  });

  test('is not there in production', async () => {
    const real = await testApp({ production: true });
    try {
      await writeLetter({ db: real.house.db, now: now() }, draft);
      for (const path of ['/dev/letters.json', '/dev/letters/1/html'])
        expect((await real.person().raw('GET', path, { headers: { accept: 'application/json' } })).status).toBe(404);
      expect(await (await real.person().raw('GET', '/dev/letters')).text()).not.toContain('Fish are ready');
    } finally {
      await real.close();
    }
  });
});

describe('the log', () => {
  let lines: Record<string, unknown>[];
  let text: string;
  beforeEach(async () => {
    lines = [];
    text = '';
    const sink = new Writable({
      write(chunk, _encoding, done) {
        text += String(chunk);
        for (const line of String(chunk).split('\n').filter(Boolean)) lines.push(JSON.parse(line));
        done();
      },
    });
    await app.close();
    app = await testApp(
      { passwordCost: 10 },
      pino({ level: 'debug', base: null, timestamp: pino.stdTimeFunctions.isoTime }, sink),
    );
  });

  test('S54 has one line for a sign-in, for a refused one, and for a refusal by role: when, who, from where, what', async () => {
    const { roomId } = await ownerWithRoom(app);
    const viewer = await memberOf(app, roomId, 'viewer');
    const email = 'astri@mail.example';
    await app.person().get(signUp, { body: { name: 'Astri', email, password: GOOD_PASSWORD } });
    await app.person().ask(signIn, { body: { email, password: 'not this one' } });
    await app.person().ask(signIn, { body: { email, password: GOOD_PASSWORD } });
    const change = { name: 'X', slug: 'xyz', place: null, timeZone: 'UTC', currency: 'EUR', units: METRIC, version: 1 };
    await viewer.ask(changeRoom, { params: { roomId }, body: change });
    const said = lines.filter(({ event }) => event === 'signIn' || event === 'forbidden');
    const account = await app.house.db.selectFrom('account').where('email', '=', email).select('id').executeTakeFirst();
    expect(said.map(({ event, outcome, how }) => [event, outcome, how])).toEqual([
      ['signIn', 'ok', 'signUp'],
      ['signIn', 'refused', 'password'],
      ['signIn', 'ok', 'password'],
      ['forbidden', 'refused', undefined],
    ]);
    for (const line of said) {
      expect(line['time']).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/);
      expect(line['req']).toMatchObject({ id: expect.stringMatching(/^[0-9a-f-]{36}$/) });
    }
    expect(said[1]).toMatchObject({ accountId: account?.id, address: expect.stringMatching(/127\.0\.0\.1|::1/) });
    expect(said[3]).toMatchObject({ accountId: viewer.id, roomId, needs: 'room:manage' });
  });

  test('S55 holds no password, no token, no link, no address; a name cannot forge a line', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const email = 'secretive@mail.example';
    const name = 'Astri\n{"level":60,"msg":"forged"}';
    const forged = await app.person().ask(signUp, { body: { name, email, password: GOOD_PASSWORD } });
    expect(forged.status).toBe(422);
    const astri = app.person();
    await astri.get(signUp, { body: { name: 'Astri {"level":60}', email, password: GOOD_PASSWORD } });
    await app.person().ask(signIn, { body: { email: `${GOOD_PASSWORD}@mail.example`, password: email } });
    await owner.get(inviteMember, { params: { roomId }, body: { email, role: 'viewer' } });
    const token = await tokenSentTo(app, email);
    await app.person().raw('GET', `/api/invitations/${token}`);
    await app.person().raw('GET', `/join/${token}?again=${token}`);
    await app.person().raw('GET', `/api/nothing/${token}`);
    await astri.raw('POST', '/api/sessions', {
      body: `{"password":"${GOOD_PASSWORD}`,
      headers: { 'content-type': 'application/json' },
    });
    expect(lines.length).toBeGreaterThan(6);
    for (const secret of [GOOD_PASSWORD, token, astri.cookie.slice(16), email]) expect(text).not.toContain(secret);
    expect(lines.some(({ msg }) => msg === 'forged')).toBe(false);
    expect(text.trim().split('\n')).toHaveLength(lines.length);
  });
});
