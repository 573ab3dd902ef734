import { notFound } from '../../shared/refusal';
import type { RoomAsked } from '../scope';

export type StoredRequest = Awaited<ReturnType<typeof oneRequest>>;

/** A request with who made it. */
export async function oneRequest({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>, requestId: string) {
  const row = await db
    .selectFrom('request')
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'request.roomId').onRef('buyer.id', '=', 'request.buyerId'),
    )
    .where('request.roomId', '=', roomId)
    .where('request.id', '=', requestId)
    .selectAll('request')
    .select(['buyer.name as buyerName', 'buyer.email', 'buyer.noticesStoppedAt'])
    .executeTakeFirst();
  if (!row) throw notFound('That request');
  return row;
}
