import { moneyOf, type PaymentMethod } from '../../shared/orders/money';
import type { RoomAsked } from '../scope';
import type { Acting } from './room';
import type { StoredOrder } from './stored';

/** The payment ledger of some orders, oldest first. */
export async function paymentsOf({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>, purchaseIds?: string[]) {
  if (purchaseIds?.length === 0) return [];
  let query = db.selectFrom('payment').where('roomId', '=', roomId).selectAll();
  if (purchaseIds) query = query.where('purchaseId', 'in', purchaseIds);
  const rows = await query.orderBy('onDay').orderBy('id').execute();
  return rows.map(({ needsRefund, ...row }) => ({ ...row, needsRefund: needsRefund === 1 }));
}

type NewPayment = {
  id: string;
  kind: 'deposit' | 'balance' | 'refund' | 'lossCredit';
  method: PaymentMethod;
  cents: number;
  onDay: string;
  outsideId?: string;
  needsRefund?: boolean;
  refunds?: string;
  note?: string | null;
};

/** Books money; false when this message of the card service is booked already. */
export async function bookPayment(scope: Acting, order: { id: string }, payment: NewPayment): Promise<boolean> {
  const { db, roomId, now, actorId = null } = scope;
  const { needsRefund = false, outsideId = null, refunds = null, note = null, ...facts } = payment;
  const done = await db
    .insertInto('payment')
    .values({
      roomId,
      purchaseId: order.id,
      at: now,
      actorId,
      outsideId,
      refunds,
      note,
      needsRefund: needsRefund ? 1 : 0,
      ...facts,
    })
    .onConflict((clash) => clash.columns(['roomId', 'outsideId']).where('outsideId', 'is not', null).doNothing())
    .executeTakeFirst();
  return Number(done.numInsertedOrUpdatedRows ?? 0) > 0;
}

/** What an order's payments come to, for letters and receipts. */
export async function moneyOfOrder(scope: RoomAsked, order: StoredOrder, lineCents: number[]) {
  const { state, way, discountCents } = order;
  return moneyOf({ state, way, discountCents, lineCents, payments: await paymentsOf(scope, [order.id]) });
}
