import type { House } from '../house';

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
/** How long what is over is still kept: long enough to look into a complaint. */
const KEPT_DAYS = 30;

/** Takes away sign-ins that ended, one-time links that are dead, and sent letters about an account alone. */
export async function sweepAccounts({ db, clock }: Pick<House, 'db' | 'clock'>): Promise<void> {
  const before = new Date(clock.now().getTime() - KEPT_DAYS * DAY_MS).toISOString();
  await db
    .deleteFrom('session')
    .where(({ or, eb }) => or([eb('endedAt', '<', before), eb('expiresAt', '<', before)]))
    .execute();
  await db.deleteFrom('mailToken').where('expiresAt', '<', before).execute();
  await db
    .deleteFrom('letter')
    .where('roomId', 'is', null)
    .where('state', '!=', 'waiting')
    .where('createdAt', '<', before)
    .execute();
}

export function startSweep(house: House): { stop(): Promise<void> } {
  const sweep = () =>
    sweepAccounts(house).catch((error: unknown) => house.log.error({ err: error, event: 'sweep' }, 'sweep failed'));
  let running = sweep();
  const timer = setInterval(() => {
    running = sweep();
  }, HOUR_MS);
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
