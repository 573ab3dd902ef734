import { dayOf, hourOf } from '../../shared/days';
import type { House } from '../house';
import { writeLetter } from '../mail/writeLetter';
import type { Asked } from '../scope';
import { asMember } from './asMember';
import { dailyLetterOf } from './dailyLetter';

const EVERY_MS = 5 * 60_000;

/** Letters of the day to those whose hour has come; once a day, and none when nothing is due. Answers how many. */
export async function writeDailyLetters(house: House): Promise<number> {
  const { db, clock, log } = house;
  const nowMs = clock.now().getTime();
  const now = new Date(nowMs).toISOString();
  // Of every fishroom: the worker has none of its own.
  const members = await db
    .selectFrom('member')
    .innerJoin('room', 'room.id', 'member.roomId')
    .innerJoin('account', 'account.id', 'member.accountId')
    .where('letterHour', 'is not', null)
    .where('account.emailVerifiedAt', 'is not', null)
    .where('account.disabledAt', 'is', null)
    .select(['roomId', 'accountId', 'letterHour', 'letterOn', 'timeZone'])
    .execute();
  let written = 0;
  for (const { roomId, accountId, letterHour, letterOn, timeZone } of members) {
    const hasCome = letterOn !== dayOf(nowMs, timeZone) && hourOf(nowMs, timeZone) >= (letterHour ?? 24);
    const asked = { db, house, now, requestId: 'daily letter', log, address: '', device: '' };
    if (hasCome && (await writeOne(asked, roomId, accountId))) written += 1;
  }
  return written;
}

async function writeOne(asked: Asked, roomId: string, accountId: string): Promise<boolean> {
  const member = await asMember(asked, roomId, accountId);
  if (!member) return false;
  const { today } = member.scope;
  const letter = await dailyLetterOf(member);
  return asked.db.transaction().execute(async (db) => {
    // Whoever marks the day writes: of two at the same time one does.
    const { numUpdatedRows } = await db
      .updateTable('member')
      .set({ letterOn: today })
      .where('roomId', '=', roomId)
      .where('accountId', '=', accountId)
      .where('letterHour', 'is not', null)
      .where(({ eb, or }) => or([eb('letterOn', 'is', null), eb('letterOn', '<>', today)]))
      .executeTakeFirst();
    if (numUpdatedRows === 0n || !letter) return false;
    await writeLetter({ ...member.scope, db }, letter);
    return true;
  });
}

/** Looks every few minutes, never twice at once. */
export function startDailyLetters(house: House): { stop(): Promise<void> } {
  let running: Promise<unknown> = Promise.resolve();
  const look = () => {
    running = running
      .then(() => writeDailyLetters(house))
      .catch((error: unknown) => house.log.error({ err: error, event: 'dailyLetters' }, 'daily letters stopped short'));
  };
  const timer = setInterval(look, EVERY_MS);
  look();
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
