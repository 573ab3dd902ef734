import type { RoomAsked } from '../scope';
import { speciesNames } from '../species';

/** The stored lines of some orders, in the order in which they were written; a fish's own facts beside them. */
export async function lineRows(scope: RoomAsked, purchaseIds: string[]) {
  if (purchaseIds.length === 0) return [];
  const { db, roomId } = scope;
  const nameOf = await speciesNames(scope);
  const rows = await db
    .selectFrom('purchaseLine')
    .leftJoin('fish', (join) =>
      join.onRef('fish.roomId', '=', 'purchaseLine.roomId').onRef('fish.id', '=', 'purchaseLine.fishId'),
    )
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'fish.roomId').onRef('strain.id', '=', 'fish.strainId'),
    )
    .where('purchaseLine.roomId', '=', roomId)
    .where('purchaseLine.purchaseId', 'in', purchaseIds)
    .selectAll('purchaseLine')
    .select(['fish.code as fishCode', 'strain.speciesId', 'strain.scientificName', 'strain.locality'])
    .orderBy('purchaseLine.id')
    .execute();
  return rows.map(({ speciesId, scientificName, ...row }) => ({
    ...row,
    speciesName: scientificName ?? (speciesId ? nameOf(speciesId) : null),
  }));
}

export type StoredLine = Awaited<ReturnType<typeof lineRows>>[number];
