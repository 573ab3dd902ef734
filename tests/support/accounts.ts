import { randomBytes } from 'node:crypto';
import { SignJWT } from 'jose';
import { sendWaiting } from '@/server/mail/outbox';
import { getMe } from '@/shared/accounts/contract';
import { foldedEmail } from '@/shared/accounts/shapes';
import type { Role } from '@/shared/roles';
import { createRoom } from '@/shared/rooms/contract';
import { METRIC } from '@/shared/units';
import { makeId, type Person, type TestApp } from './testApp';

/** A password that the rules take; builders hash none, since a hash costs a third of a second. */
export const GOOD_PASSWORD = 'green tank by the window';

let people = 0;

export type Known = Person & { id: string; name: string; email: string };

/** An account with a confirmed address, signed in. Written straight to the database: signing up has tests of its own. */
export async function personWithAccount(
  app: TestApp,
  { name, email, verified = true }: { name?: string; email?: string; verified?: boolean } = {},
): Promise<Known> {
  people += 1;
  const id = makeId();
  const now = app.house.clock.now().toISOString();
  const person = {
    id,
    name: name ?? `Person ${people}`,
    email: email ?? `person${people}-${randomBytes(3).toString('hex')}@mail.example`,
  };
  await app.house.db
    .insertInto('account')
    .values({
      ...person,
      emailFolded: foldedEmail(person.email),
      passwordHash: null,
      emailVerifiedAt: verified ? now : null,
      disabledAt: null,
      totpSecret: null,
      totpEnabledAt: null,
      totpLastStep: null,
      createdAt: now,
    })
    .execute();
  const known = Object.assign(app.person(), person);
  known.cookie = await cookieFor(app, id);
  return known;
}

/** A sign-in as the server writes it: the cookie of a fresh session row. */
export async function cookieFor(app: TestApp, accountId: string): Promise<string> {
  const { db, clock, config } = app.house;
  const nowMs = clock.now().getTime();
  const id = makeId();
  const expiresMs = nowMs + 120 * 86_400_000;
  await db
    .insertInto('session')
    .values({
      id,
      accountId,
      createdAt: new Date(nowMs).toISOString(),
      lastSeenAt: new Date(nowMs).toISOString(),
      expiresAt: new Date(expiresMs).toISOString(),
      endedAt: null,
      device: 'test',
      address: '127.0.0.1',
    })
    .execute();
  const token = await new SignJWT({})
    .setProtectedHeader({ alg: 'HS256', typ: 'kinwater-session' })
    .setSubject(id)
    .setAudience('kinwater-session')
    .setIssuedAt(Math.floor(nowMs / 1000))
    .setExpirationTime(Math.floor(expiresMs / 1000))
    .sign(new TextEncoder().encode(config.secret));
  return `__Host-kinwater=${token}`;
}

/** A person who owns a fishroom: metric units, euros, Oslo time. */
export async function ownerWithRoom(
  app: TestApp,
  room: Partial<{ name: string; timeZone: string; currency: string }> = {},
): Promise<{ owner: Known; roomId: string }> {
  const owner = await personWithAccount(app);
  const { id } = await owner.get(createRoom, {
    body: { name: 'Back Room', place: null, timeZone: 'Europe/Oslo', currency: 'EUR', units: METRIC, ...room },
  });
  return { owner, roomId: id };
}

/** Another person with a role in the fishroom. */
export async function memberOf(app: TestApp, roomId: string, role: Role): Promise<Known> {
  const person = await personWithAccount(app);
  const joinedAt = app.house.clock.now().toISOString();
  await app.house.db.insertInto('member').values({ roomId, accountId: person.id, role, joinedAt }).execute();
  return person;
}

/** The letters that reached an address, oldest first, after everything that waited has been sent. */
export async function lettersTo(app: TestApp, email: string) {
  while ((await sendWaiting(app.house)) > 0);
  return (app.house.sink?.letters ?? []).filter((letter) => letter.to.toLowerCase().includes(email.toLowerCase()));
}

/** The secret word of the link in the newest letter to an address. */
export async function tokenSentTo(app: TestApp, email: string): Promise<string> {
  const letter = (await lettersTo(app, email)).at(-1);
  const token = /[#/]([\w-]{43})\s/.exec(letter?.text ?? '')?.[1];
  if (!token) throw new Error(`No link in the newest letter to ${email}`);
  return token;
}

/** Who the server takes a person for; null when signed out. */
export async function seenAs(person: Person): Promise<string | null> {
  const { status, body } = await person.ask(getMe);
  return status === 200 ? body.account.email : null;
}
