import type { OrderState } from '../../shared/orders/state';
import { notFound, Refusal } from '../../shared/refusal';
import type { Database } from '../db/schema';
import type { RoomAsked } from '../scope';

/** An order as it is stored, for rules that change it. */
export async function storedOrder({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>, orderId: string) {
  const order = await db
    .selectFrom('purchase')
    .where('roomId', '=', roomId)
    .where('id', '=', orderId)
    .selectAll()
    .executeTakeFirst();
  if (!order) throw notFound('That order');
  return order;
}

export type StoredOrder = Awaited<ReturnType<typeof storedOrder>>;

/** The order as it was seen by whoever changes it; else the present one comes back with the refusal. */
export function mustBeSeen(order: StoredOrder, version: number, current: unknown): void {
  if (order.version !== version)
    throw new Refusal('conflict', 'This order was changed in the meantime. Look at it again.', {}, { current });
}

type Change = Partial<
  Omit<Database['purchase'], 'roomId' | 'id' | 'state' | 'version' | 'way' | 'discountCents' | 'offeredTimes'>
> & {
  state?: OrderState;
  discountCents?: number;
  offeredTimes?: string;
};

export async function changeStored({ db, roomId }: RoomAsked, orderId: string, change: Change): Promise<void> {
  await db
    .updateTable('purchase')
    .set((eb) => ({ ...change, version: eb('version', '+', 1) }))
    .where('roomId', '=', roomId)
    .where('id', '=', orderId)
    .execute();
}
