import type { Db } from './open';

/** For changes that show in a fishroom and come from outside it: what was read before is no longer the present state. */
export async function touchRooms(db: Db, roomIds: string[]): Promise<void> {
  if (roomIds.length === 0) return;
  await db
    .updateTable('room')
    .set(({ eb }) => ({ changeNumber: eb('changeNumber', '+', 1) }))
    .where('id', 'in', roomIds)
    .execute();
}
