import { touchRooms } from '../db/touchRooms';
import type { House } from '../house';

const EVERY_MS = 15_000;

/**
 * A reservation that runs out is judged when it is read; but a page that was read before would be answered "unchanged".
 * Fishrooms in which one ran out since the last look are touched, so that the next reading is fresh.
 */
export async function touchLapsed({ db }: Pick<House, 'db'>, since: string, until: string): Promise<number> {
  const rows = await db
    .selectFrom('reservation')
    .where('freedAt', 'is', null)
    .where('until', '>', since)
    .where('until', '<=', until)
    .select('roomId')
    .distinct()
    .execute();
  await touchRooms(
    db,
    rows.map(({ roomId }) => roomId),
  );
  return rows.length;
}

export function startLapses(house: House): { stop(): Promise<void> } {
  let since = new Date(house.clock.now().getTime() - EVERY_MS).toISOString();
  let running: Promise<unknown> = Promise.resolve();
  const timer = setInterval(() => {
    running = running
      .then(async () => {
        const now = house.clock.now().toISOString();
        await touchLapsed(house, since, now);
        since = now;
      })
      .catch((error: unknown) => house.log.error({ err: error, event: 'lapses' }, 'a look at reservations failed'));
  }, EVERY_MS);
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
