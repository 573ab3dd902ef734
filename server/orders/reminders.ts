import { addDays, dayOf, hourOf } from '../../shared/days';
import { touchRooms } from '../db/touchRooms';
import type { House } from '../house';
import { writeOrderLetter } from './letters';
import { roomAsked } from './room';

const EVERY_MS = 10 * 60_000;
/** Not in the night before: letters go out from this hour of the fishroom's day. */
const FROM_HOUR = 8;

/** Letters of the day before a collection, once for each agreed time. Answers how many were written. */
export async function remind(house: House): Promise<number> {
  const { db, clock, log } = house;
  const now = clock.now().toISOString();
  // Of every fishroom: the worker has none of its own.
  const due = await db
    .selectFrom('purchase')
    .innerJoin('room', 'room.id', 'purchase.roomId')
    .where('purchase.state', 'in', ['reserved', 'depositPaid', 'ready'])
    .where('purchase.agreedTime', 'is not', null)
    .select(['purchase.roomId', 'purchase.id', 'purchase.agreedTime', 'room.timeZone'])
    .execute();
  let written = 0;
  for (const { roomId, id, agreedTime, timeZone } of due) {
    const today = dayOf(Date.parse(now), timeZone);
    if (agreedTime?.slice(0, 10) !== addDays(today, 1) || hourOf(Date.parse(now), timeZone) < FROM_HOUR) continue;
    const asked = { db, house, now, requestId: 'reminder', log, address: '', device: '' };
    const done = await db.transaction().execute(async (inside) => {
      const earlier = await inside
        .selectFrom('letter')
        .where('roomId', '=', roomId)
        .where('aboutId', '=', id)
        .where('kind', '=', 'reminder')
        .where('createdAt', '>', new Date(Date.parse(now) - 24 * 3_600_000).toISOString())
        .select('id')
        .executeTakeFirst();
      if (earlier) return 0;
      await touchRooms(inside, [roomId]);
      await writeOrderLetter(await roomAsked({ ...asked, db: inside }, roomId), id, 'reminder');
      return 1;
    });
    written += done;
  }
  return written;
}

/** Looks every ten minutes, never twice at once. */
export function startReminders(house: House): { stop(): Promise<void> } {
  let running: Promise<unknown> = Promise.resolve();
  const look = () => {
    running = running
      .then(() => remind(house))
      .catch((error: unknown) => house.log.error({ err: error, event: 'reminders' }, 'reminders stopped short'));
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
