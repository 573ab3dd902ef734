import type { RoomAsked } from '../scope';

export type Source = { broodId: string; code: string; strainId: string | null; spawnLatest: string; heads: number };

type Row = Source & { batchId: string; fromDay: string; id: string; entryId: string | null };

/**
 * The broods that swim in each batch, as on a day. Every start and every joining stores the whole list anew, so the list in
 * force is the last one made by then; undoing a joining brings back the one before.
 */
export async function sourcesOf(
  { db, roomId }: RoomAsked,
  batchIds: string[],
  onDay = '9999-12-31',
): Promise<Map<string, Source[]>> {
  const lists = new Map<string, Source[]>();
  if (batchIds.length === 0) return lists;
  const rows: Row[] = await db
    .selectFrom('batchSource')
    .innerJoin('brood', (join) =>
      join.onRef('brood.roomId', '=', 'batchSource.roomId').onRef('brood.id', '=', 'batchSource.broodId'),
    )
    .where('batchSource.roomId', '=', roomId)
    .where('batchSource.batchId', 'in', batchIds)
    .select([
      'batchSource.id',
      'batchSource.batchId',
      'batchSource.broodId',
      'batchSource.heads',
      'batchSource.fromDay',
      'batchSource.entryId',
      'brood.code',
      'brood.strainId',
      'brood.spawnLatest',
    ])
    .orderBy('batchSource.fromDay')
    .orderBy('batchSource.id')
    .execute();
  for (const batchId of batchIds) {
    const own = rows.filter((row) => row.batchId === batchId);
    // A fish that left before the batch's first list on record came out of that first list.
    const last = own.findLast(({ fromDay }) => fromDay <= onDay) ?? own[0];
    const inForce = own.filter(({ entryId, fromDay }) => last && entryId === last.entryId && fromDay === last.fromDay);
    lists.set(
      batchId,
      inForce.map(({ broodId, code, strainId, spawnLatest, heads }) => ({
        broodId,
        code,
        strainId,
        spawnLatest,
        heads,
      })),
    );
  }
  return lists;
}

/** Each source's share of the batch; equal shares where no heads are known yet. */
export function sharesOf(sources: Source[]): number[] {
  const sum = sources.reduce((total, { heads }) => total + heads, 0);
  return sources.map(({ heads }) => (sum > 0 ? heads / sum : 1 / sources.length));
}
