import { createHmac } from 'node:crypto';
import { hourOf } from '../../shared/days';
import type { MyDay } from '../../shared/today/contract';
import type { Config } from '../config';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { hashOfToken } from '../mail/tokens';
import type { Scope } from '../scope';

/** The secret word of a calendar's address, 256 bits: worked out from the row's id, which alone says nothing. */
const secretOf = ({ secret }: Pick<Config, 'secret'>, calendarId: string): string =>
  createHmac('sha256', secret).update(`calendar ${calendarId}`).digest('base64url');

export async function myDay(scope: Scope): Promise<MyDay> {
  const { db, roomId, accountId, house } = scope;
  const { letterHour, calendarId } = await db
    .selectFrom('member')
    .where('roomId', '=', roomId)
    .where('accountId', '=', accountId)
    .select(['letterHour', 'calendarId'])
    .executeTakeFirstOrThrow();
  const { origin } = house.config;
  const calendarUrl = calendarId && `${origin}/calendar/${secretOf(house.config, calendarId)}.ics`;
  return { letterHour, calendarUrl };
}

const own = ({ db, roomId, accountId }: Scope) =>
  db.updateTable('member').where('roomId', '=', roomId).where('accountId', '=', accountId);

/** A letter whose hour has passed today begins tomorrow. */
export async function setLetterHour(scope: Scope, hour: number | null): Promise<MyDay> {
  const { now, timeZone, today, accountId } = scope;
  const passed = hour !== null && hourOf(Date.parse(now), timeZone) >= hour;
  await own(scope)
    .set({ letterHour: hour, ...(passed ? { letterOn: today } : {}) })
    .execute();
  await audit(scope, { action: 'daily letter set', about: 'member', aboutId: accountId });
  return myDay(scope);
}

export async function makeCalendar(scope: Scope): Promise<MyDay> {
  const { now, house, accountId } = scope;
  const calendarId = newId(now);
  const calendarHash = hashOfToken(secretOf(house.config, calendarId));
  await own(scope).set({ calendarId, calendarHash }).execute();
  await audit(scope, { action: 'calendar address made', about: 'member', aboutId: accountId });
  return myDay(scope);
}

export async function dropCalendar(scope: Scope): Promise<MyDay> {
  await own(scope).set({ calendarId: null, calendarHash: null }).execute();
  await audit(scope, { action: 'calendar address ended', about: 'member', aboutId: scope.accountId });
  return myDay(scope);
}
