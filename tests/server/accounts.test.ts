import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { changeAccount, getMe, signIn, signUp } from '@/shared/accounts/contract';
import { changeEmail, changePassword } from '@/shared/accounts/security';
import { changeRoom, createRoom, getRoom } from '@/shared/rooms/contract';
import { METRIC, US } from '@/shared/units';
import { GOOD_PASSWORD, lettersTo, memberOf, ownerWithRoom, personWithAccount, seenAs } from '../support/accounts';
import { type Person, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await testApp({ passwordCost: 10 });
});
afterAll(() => app.close());

let count = 0;
async function signedUp(password = GOOD_PASSWORD): Promise<Person & { email: string }> {
  count += 1;
  const email = `breeder${count}@mail.example`;
  const person = Object.assign(app.person(), { email });
  await person.get(signUp, { body: { name: 'Runa Vik', email, password } });
  return person;
}

const tryPassword = (password: string, email = `try${++count}@mail.example`) =>
  app.person().ask(signUp, { body: { name: 'Runa Vik', email, password } });

const accountRow = (email: string) =>
  app.house.db.selectFrom('account').where('email', '=', email).selectAll().executeTakeFirst();

describe('signing up', () => {
  test('a breeder signs up, is signed in, makes a fishroom and owns it', async () => {
    const runa = await signedUp();
    const room = await runa.get(createRoom, {
      body: { name: 'Ødegårds Kjeller', place: 'Cellar', timeZone: 'Pacific/Auckland', currency: 'NOK', units: US },
    });
    expect(room.slug).toBe('degards-kjeller');
    const me = await runa.get(getMe);
    // 09:12 UTC on 14 May is 21:12 in Auckland: the same day there.
    expect(me.rooms).toEqual([
      expect.objectContaining({ id: room.id, name: 'Ødegårds Kjeller', role: 'owner', today: '2026-05-14', units: US }),
    ]);
    expect(me.account).toMatchObject({ email: runa.email, emailVerified: false, hasPassword: true, secondStep: false });
    expect((await lettersTo(app, runa.email)).map(({ subject }) => subject)).toEqual(['Confirm your address']);
  });

  test('names every field that needs another look', async () => {
    const answer = await app.person().ask(signUp, { body: { name: '  ', email: 'nobody', password: 'short', age: 3 } });
    expect(answer.status).toBe(422);
    expect(Object.keys(answer.body.error?.fields ?? {}).sort()).toEqual(['age', 'email', 'name', 'password']);
  });

  test('an address in another spelling is the same address', async () => {
    const runa = await signedUp();
    const again = await tryPassword(GOOD_PASSWORD, ` ${runa.email.toUpperCase()} `);
    expect(again.status).toBe(409);
    expect(again.body.error?.fields?.['email']).toMatch(/has an account already/);
  });

  test('two who sign up with one address at once make one account', async () => {
    const answers = await Promise.all([1, 2, 3].map(() => tryPassword(GOOD_PASSWORD, 'race@mail.example')));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
  });
});

describe('passwords', () => {
  test('S01 seven letters are too few: the field is named and nothing is stored', async () => {
    const answer = await tryPassword('7 fishy', 's01@mail.example');
    expect(answer.status).toBe(422);
    expect(answer.body.error?.fields).toEqual({ password: 'Use at least 8 letters' });
    expect(await accountRow('s01@mail.example')).toBeUndefined();
  });

  test.each([
    ['64 letters with spaces and emoji', `${'tank 🐟 '.repeat(9)}!`.slice(0, 66)],
    ['128 letters', 'Ab3 déf🐠'.repeat(16).normalize('NFC')],
  ])('S02 %s are kept whole: the last letter and the case matter', async (_name, password) => {
    expect([...password].length).toBeLessThanOrEqual(128);
    const person = await signedUp(password);
    const attempt = (text: string) => app.person().ask(signIn, { body: { email: person.email, password: text } });
    expect((await attempt(password)).status).toBe(200);
    expect((await attempt([...password].slice(0, -1).join(''))).status).toBe(401);
    const otherCase = password.replace(/[a-zA-Z]/, (letter) =>
      letter === letter.toUpperCase() ? letter.toLowerCase() : letter.toUpperCase(),
    );
    expect((await attempt(otherCase)).status).toBe(401);
  });

  test('S02 129 letters are too many', async () => {
    expect((await tryPassword('x'.repeat(129))).status).toBe(422);
  });

  test('S03 fifteen small letters are enough: no rule asks for digits or signs', async () => {
    expect((await tryPassword('quietwaterpipes')).status).toBe(200);
  });

  test.each(['password123', '12345678', 'kinwater', 'Kinwater2026!', 'qwertyuiop', 'PASSWORD123', 'Football1'])(
    'S04 %s is too common',
    async (password) => {
      const answer = await tryPassword(password);
      expect(answer.status).toBe(422);
      expect(answer.body.error?.fields?.['password']).toMatch(/Too many people use this one/);
    },
  );

  test('S04 nor may it be the person’s own name or address', async () => {
    for (const password of ['Runa Vik', 'runavik2026', 'mail.example', 'own.address@mail.example', 'own.address']) {
      const answer = await tryPassword(password, 'own.address@mail.example');
      expect(answer.status, password).toBe(422);
    }
  });

  test('S05 changing the password or the address needs the present password', async () => {
    const person = await signedUp();
    const wrong = { current: 'not my password', password: 'another good phrase' };
    expect((await person.ask(changePassword, { body: wrong })).status).toBe(403);
    expect((await person.ask(changePassword, { body: { ...wrong, current: null } })).status).toBe(403);
    expect((await person.ask(changePassword, { body: { password: wrong.password } })).status).toBe(422);
    const email = 'thief@mail.example';
    const answer = await person.ask(changeEmail, { body: { current: 'not my password', email } });
    expect([answer.status, answer.body.error?.fields]).toEqual([403, { current: 'That is not your password' }]);
    expect((await person.ask(changeEmail, { body: { email } })).status).toBe(422);
    expect((await app.person().ask(signIn, { body: { email: person.email, password: GOOD_PASSWORD } })).status).toBe(
      200,
    );
    expect(await lettersTo(app, email)).toEqual([]);
  });

  test('S05 with it, the password changes', async () => {
    const person = await signedUp();
    await person.get(changePassword, { body: { current: GOOD_PASSWORD, password: 'another good phrase' } });
    const attempt = (password: string) => app.person().ask(signIn, { body: { email: person.email, password } });
    expect((await attempt('another good phrase')).status).toBe(200);
    expect((await attempt(GOOD_PASSWORD)).status).toBe(401);
    expect((await lettersTo(app, person.email)).at(-1)?.subject).toBe('Your password was changed');
  });

  test('S06 the data file holds scrypt at N = 2^17, r = 8, p = 1, and two people’s same password looks unlike', async () => {
    const real = await testApp();
    try {
      const emails = ['one@mail.example', 'two@mail.example'];
      for (const email of emails)
        await real.person().get(signUp, { body: { name: 'Runa', email, password: GOOD_PASSWORD } });
      const rows = await real.house.db.selectFrom('account').select('passwordHash').execute();
      const hashes = rows.map(({ passwordHash }) => passwordHash ?? '');
      expect(hashes.map((hash) => hash.split('$').slice(0, 4).join('$'))).toEqual(['scrypt$17$8$1', 'scrypt$17$8$1']);
      expect(new Set(hashes).size).toBe(2);
      expect(JSON.stringify(rows)).not.toContain(GOOD_PASSWORD);
    } finally {
      await real.close();
    }
  });

  test('many who sign in at once are served in turn, and past that told to wait', async () => {
    const slow = await testApp({ passwordCost: 15 });
    try {
      const attempts = Array.from({ length: 40 }, (_, i) =>
        slow.person().ask(signIn, { body: { email: `p${i}@mail.example`, password: 'anything at all' } }),
      );
      const answers = await Promise.all(attempts);
      const waits = answers.filter(({ status }) => status === 503);
      expect(answers.filter(({ status }) => status === 401).length).toBeGreaterThanOrEqual(22);
      expect(waits.length).toBeGreaterThan(0);
      expect(waits[0]?.headers.get('retry-after')).toBe('5');
    } finally {
      await slow.close();
    }
  });
});

describe('one’s own account', () => {
  test('the name and the units can be changed, and the fishroom shows the new name', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const { account } = await owner.get(getMe);
    const tag = (await owner.ask(getRoom, { params: { roomId } })).headers.get('etag') ?? '';
    const choices = { units: { ...METRIC, length: 'in' } };
    await owner.get(changeAccount, { body: { name: 'Ask Vik', choices, version: account.version } });
    const me = await owner.get(getMe);
    expect(me.account).toMatchObject({ name: 'Ask Vik', choices, version: account.version + 1 });
    const again = await owner.raw('GET', `/api/rooms/${roomId}`, { headers: { 'if-none-match': tag } });
    expect(again.status).toBe(200);
  });

  test('of two changes made side by side the second is shown what the first did', async () => {
    const person = await personWithAccount(app);
    await person.get(changeAccount, { body: { name: 'First', version: 1 } });
    const late = await person.ask(changeAccount, { body: { name: 'Second', version: 1 } });
    expect([late.status, late.body.error?.current]).toEqual([409, expect.objectContaining({ name: 'First' })]);
  });

  test('S36 what is nobody’s to set is refused, and stays as it was', async () => {
    const person = await personWithAccount(app);
    const forged = { role: 'owner', id: 'x', createdAt: '2020-01-01', emailVerifiedAt: 'now', version: 1 };
    const answer = await person.ask(changeAccount, { body: forged });
    expect(answer.status).toBe(422);
    expect((await person.get(getMe)).account.version).toBe(1);
  });
});

describe('the fishroom', () => {
  const body = { name: 'Back Room', place: null, timeZone: 'Europe/Oslo', currency: 'EUR', units: METRIC };

  test('names what cannot be: a zone, a currency, a unit', async () => {
    const person = await personWithAccount(app);
    const wrong = { ...body, timeZone: 'Atlantis', currency: 'fish', units: { ...METRIC, length: 'ell' } };
    const answer = await person.ask(createRoom, { body: wrong });
    expect([answer.status, Object.keys(answer.body.error?.fields ?? {}).sort()]).toEqual([
      422,
      ['currency', 'timeZone', 'units.length'],
    ]);
  });

  test('two of one name have addresses of their own', async () => {
    const person = await personWithAccount(app);
    const first = await person.get(createRoom, { body: { ...body, name: 'The Same Cellar' } });
    const second = await person.get(createRoom, { body: { ...body, name: 'The Same Cellar' } });
    expect(first.slug).toBe('the-same-cellar');
    expect(second.slug).toMatch(/^the-same-cellar-[0-9a-f]{4}$/);
  });

  test('a name without a Latin letter has an address too', async () => {
    const person = await personWithAccount(app);
    expect((await person.get(createRoom, { body: { ...body, name: '水族館' } })).slug).toMatch(/^room-[0-9a-f]{6}$/);
  });

  test('its owner changes it; a keeper may not; a stranger finds nothing', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const keeper = await memberOf(app, roomId, 'keeper');
    const stranger = await personWithAccount(app);
    const change = { ...body, name: 'New Name', slug: `new-name-${++count}`, timeZone: 'America/Chicago', version: 1 };
    expect((await keeper.ask(changeRoom, { params: { roomId }, body: change })).status).toBe(403);
    expect((await stranger.ask(changeRoom, { params: { roomId }, body: change })).status).toBe(404);
    expect((await app.person().ask(changeRoom, { params: { roomId }, body: change })).status).toBe(401);
    const after = await owner.get(changeRoom, { params: { roomId }, body: change });
    // 09:12 UTC is 04:12 in Chicago: still the same day.
    expect(after).toMatchObject({ name: 'New Name', timeZone: 'America/Chicago', today: '2026-05-14', version: 2 });
    const late = await owner.ask(changeRoom, { params: { roomId }, body: change });
    expect([late.status, late.body.error?.current]).toEqual([409, expect.objectContaining({ version: 2 })]);
  });

  test('an address that another fishroom has is refused at its field', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const { slug } = await owner.get(createRoom, { body: { ...body, name: 'Taken Address' } });
    const answer = await owner.ask(changeRoom, { params: { roomId }, body: { ...body, slug, version: 1 } });
    expect([answer.status, answer.body.error?.fields]).toEqual([409, { slug: 'Another fishroom has that word' }]);
  });

  test('its currency stays once there are orders in it: 1250 pence are not 1250 yen', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const { slug } = await owner.get(getRoom, { params: { roomId } });
    const change = (currency: string, version: number) =>
      owner.ask(changeRoom, { params: { roomId }, body: { ...body, currency, slug, version } });
    expect((await change('GBP', 1)).status).toBe(200);
    const at = app.house.clock.now().toISOString();
    const { db } = app.house;
    await db.insertInto('buyer').values({ roomId, id: 'buyer', name: 'Ane', createdAt: at }).execute();
    await db
      .insertInto('purchase')
      .values({ roomId, id: 'order', number: 1, buyerId: 'buyer', state: 'reserved', tokenHash: roomId, createdAt: at })
      .execute();
    const refused = await change('JPY', 2);
    expect([refused.status, Object.keys(refused.body.error?.fields ?? {})]).toEqual([409, ['currency']]);
    expect((await change('GBP', 2)).status).toBe(200);
  });

  test('what other settings it has outlive a change of units', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const { db } = app.house;
    await db
      .updateTable('room')
      .set({ settings: JSON.stringify({ units: METRIC, due: { fry: 7 } }) })
      .where('id', '=', roomId)
      .execute();
    const { slug } = await owner.get(getRoom, { params: { roomId } });
    await owner.get(changeRoom, { params: { roomId }, body: { ...body, units: US, slug, version: 1 } });
    const { settings } = await db
      .selectFrom('room')
      .where('id', '=', roomId)
      .select('settings')
      .executeTakeFirstOrThrow();
    expect(JSON.parse(settings)).toEqual({ units: US, due: { fry: 7 } });
  });

  test('nobody signed in: nothing at all', async () => {
    expect(await seenAs(app.person())).toBeNull();
    expect((await app.person().ask(createRoom, { body })).status).toBe(401);
  });
});
