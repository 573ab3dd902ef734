import { newId } from '../db/newId';
import { startStay } from '../fish';
import type { Scope } from '../scope';
import { addLine } from './ledger';

/**
 * Heads that come back from a buyer: a batch of their own in a quarantine tank. They count as fish of the brood, but are
 * kept back, so that they are not available until the keeper frees them.
 */
export async function returnHeads(
  scope: Scope,
  back: { id: string; broodId: string; heads: number; tankId: string; onDay: string; note: string | null },
): Promise<void> {
  const { db, roomId, now } = scope;
  const { id: batchId, broodId, heads, tankId, onDay, note } = back;
  const own = { roomId, entryId: null };
  await db
    .insertInto('batch')
    .values({ ...own, id: batchId, startedOn: onDay, note, createdAt: now })
    .execute();
  await db
    .insertInto('batchSource')
    .values({ ...own, id: newId(now), batchId, broodId, heads, fromDay: onDay })
    .execute();
  await startStay(scope, { column: 'batchId', id: batchId, tankId, onDay, entryId: null });
  await addLine(scope, { batchId, kind: 'returned', onDay, heads, note, entryId: null });
  await db
    .insertInto('reservation')
    .values({
      ...own,
      id: newId(now),
      broodId,
      batchId,
      kind: 'keep',
      heads,
      purchaseLineId: null,
      until: null,
      freedAt: null,
      note: 'Returned, in quarantine',
      createdAt: now,
    })
    .execute();
}
