import { DEFAULT_INTERVALS, Intervals } from '../../shared/today/intervals';
import { audit } from '../db/audit';
import type { Scope } from '../scope';

/** The fishroom's intervals; what it has not set is the program's. */
export async function intervalsOf({ db, roomId }: Scope): Promise<Intervals> {
  const { settings } = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select('settings')
    .executeTakeFirstOrThrow();
  const known = Intervals.safeParse(JSON.parse(settings)['intervals']);
  return known.success ? known.data : DEFAULT_INTERVALS;
}

export async function setIntervals(scope: Scope, intervals: Intervals): Promise<Intervals> {
  const { db, roomId } = scope;
  const { settings } = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select('settings')
    .executeTakeFirstOrThrow();
  await db
    .updateTable('room')
    .set({ settings: JSON.stringify({ ...JSON.parse(settings), intervals }) })
    .where('id', '=', roomId)
    .execute();
  await audit(scope, { action: 'intervals changed', about: 'fishroom', aboutId: roomId });
  return intervals;
}
