import { Refusal } from '../../shared/refusal';
import { newId } from '../db/newId';
import type { RoomAsked } from '../scope';
import { availableOf } from './available';

export type Wanted = { broodId: string; heads: number; purchaseLineId: string; code: string; field: string };

/**
 * Holds heads until an instant. All or none, inside a write transaction: two that ask at once are judged one after the
 * other, so no head is promised twice.
 */
export async function reserveHeads(scope: RoomAsked, wanted: Wanted[], until: string | null): Promise<void> {
  const { db, roomId, now } = scope;
  for (const { broodId, heads, purchaseLineId, code, field } of wanted) {
    const { available } = await availableOf(scope, broodId);
    if (available < heads) {
      const left = Math.max(0, available);
      throw new Refusal('conflict', left === 0 ? `No fish of ${code} are available` : `Only ${left} of ${code} left`, {
        [field]: `At most ${left}`,
      });
    }
    await db
      .insertInto('reservation')
      .values({
        roomId,
        id: newId(now),
        broodId,
        batchId: null,
        kind: 'order',
        heads,
        purchaseLineId,
        until,
        freedAt: null,
        note: null,
        createdAt: now,
        entryId: null,
      })
      .execute();
  }
}

/** The heads of these order lines are free from now on. */
export async function freeHeads({ db, roomId, now }: RoomAsked, purchaseLineIds: string[]): Promise<void> {
  if (purchaseLineIds.length === 0) return;
  await db
    .updateTable('reservation')
    .set({ freedAt: now })
    .where('roomId', '=', roomId)
    .where('purchaseLineId', 'in', purchaseLineIds)
    .where('freedAt', 'is', null)
    .execute();
}

/** Moves the end of what is still held; null: until the fish leave. What ran out stays free. */
export async function holdUntil(
  { db, roomId, now }: RoomAsked,
  purchaseLineIds: string[],
  until: string | null,
): Promise<void> {
  if (purchaseLineIds.length === 0) return;
  await db
    .updateTable('reservation')
    .set({ until })
    .where('roomId', '=', roomId)
    .where('purchaseLineId', 'in', purchaseLineIds)
    .where('freedAt', 'is', null)
    .where(({ eb, or }) => or([eb('until', 'is', null), eb('until', '>', now)]))
    .execute();
}

/** Another number of heads for a line that is held; it keeps its place in the row. The caller has judged whether they are there. */
export async function changeClaim({ db, roomId }: RoomAsked, purchaseLineId: string, heads: number): Promise<void> {
  await db
    .updateTable('reservation')
    .set({ heads })
    .where('roomId', '=', roomId)
    .where('purchaseLineId', '=', purchaseLineId)
    .where('freedAt', 'is', null)
    .execute();
}

/** What is held in a fishroom now, first come first: judged at this instant, since a reservation may just have run out. */
export async function claimsOf({ db, roomId, now }: RoomAsked) {
  return db
    .selectFrom('reservation')
    .where('roomId', '=', roomId)
    .where('freedAt', 'is', null)
    .where(({ eb, or }) => or([eb('until', 'is', null), eb('until', '>', now)]))
    .select(['id', 'broodId', 'kind', 'heads', 'purchaseLineId', 'until'])
    .orderBy('createdAt')
    .orderBy('id')
    .execute();
}
