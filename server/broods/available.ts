import { headCountOf } from '../../shared/broods/headCount';
import type { RoomAsked } from '../scope';
import { linesOf } from './ledger';
import { sharesOf, sourcesOf } from './sources';

/** Heads of a brood today, those reserved, and what is left. Of a mixed batch the brood has its share, rounded down. */
export async function availableOf(
  scope: RoomAsked,
  broodId: string,
): Promise<{ heads: number; reserved: number; available: number }> {
  const { db, roomId } = scope;
  const rows = await db
    .selectFrom('batchSource')
    .where('roomId', '=', roomId)
    .where('broodId', '=', broodId)
    .select('batchId')
    .distinct()
    .execute();
  const batchIds = rows.map(({ batchId }) => batchId);
  const lists = await sourcesOf(scope, batchIds);
  const lines = await linesOf(scope, batchIds);
  let heads = 0;
  for (const batchId of batchIds) {
    const sources = lists.get(batchId) ?? [];
    const share = sharesOf(sources)[sources.findIndex((source) => source.broodId === broodId)] ?? 0;
    heads += headCountOf(lines.filter((line) => line.batchId === batchId)).balance * share;
  }
  const reserved = await reservedOf(scope, broodId);
  const whole = Math.floor(heads + 1e-9);
  return { heads: whole, reserved, available: whole - reserved };
}

/** Heads under a reservation that is still in force: not freed, and not past its time. */
export async function reservedOf({ db, roomId, now }: RoomAsked, broodId: string): Promise<number> {
  const row = await db
    .selectFrom('reservation')
    .where('roomId', '=', roomId)
    .where('broodId', '=', broodId)
    .where('freedAt', 'is', null)
    .where(({ eb, or }) => or([eb('until', 'is', null), eb('until', '>', now)]))
    .select(({ fn }) => fn.sum<number>('heads').as('heads'))
    .executeTakeFirst();
  return Number(row?.heads ?? 0);
}
