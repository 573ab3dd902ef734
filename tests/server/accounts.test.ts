import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { getMe, signIn, signOut, signUp } from '@/shared/accounts/contract';
import { createRoom } from '@/shared/rooms/contract';
import { METRIC } from '@/shared/units';
import { GOOD_PASSWORD, lettersTo, memberOf, ownerWithRoom, seenAs } from '../support/accounts';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await testApp({ passwordCost: 12 });
});
afterAll(() => app.close());

describe('signing up', () => {
  test('a breeder signs up, is signed in, and makes a fishroom', async () => {
    const person = app.person();
    await person.get(signUp, { body: { name: 'Runa', email: 'runa@mail.example', password: GOOD_PASSWORD } });
    expect(await seenAs(person)).toBe('runa@mail.example');
    const room = await person.get(createRoom, {
      body: { name: 'Kjeller Ødegård', place: 'Cellar', timeZone: 'Europe/Oslo', currency: 'NOK', units: METRIC },
    });
    const me = await person.get(getMe);
    expect(me.rooms).toEqual([
      expect.objectContaining({ id: room.id, name: 'Kjeller Ødegård', role: 'owner', today: '2026-05-14' }),
    ]);
    const [letter] = await lettersTo(app, 'runa@mail.example');
    expect(letter?.subject).toBe('Confirm your address');
  });
});
describe('builders', () => {
  test('an owner and a viewer see the fishroom with their own roles', async () => {
    const { roomId } = await ownerWithRoom(app);
    const viewer = await memberOf(app, roomId, 'viewer');
    expect((await viewer.get(getMe)).rooms[0]?.role).toBe('viewer');
  });
  test('signs out', async () => {
    const person = app.person();
    await person.get(signIn, { body: { email: ' RUNA@mail.example', password: GOOD_PASSWORD } });
    await person.get(signOut);
    expect(await seenAs(person)).toBeNull();
  });
});
