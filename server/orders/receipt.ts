import type { Response } from 'express';
import { PAYMENT_KIND_WORDS, PAYMENT_METHOD_WORDS } from '../../shared/orders/money';
import { ReceiptContent } from '../../shared/orders/receipt';
import { ORDER_WAY_WORDS } from '../../shared/orders/state';
import type { Paper } from '../../shared/print/page';
import { notFound } from '../../shared/refusal';
import { newId } from '../db/newId';
import { receiptPdf } from '../print';
import type { RoomAsked, Scope } from '../scope';
import { moneyOfOrder, paymentsOf } from './ledger';
import { sheetsOf } from './letters';
import { lineRows } from './lines';
import { EVERYTHING } from './room';
import { oneOrder } from './rows';
import { storedOrder } from './stored';

/** Writes what left, for how much, and what was paid by then. It is not changed by what happens afterwards. */
export async function freezeReceipt(scope: Scope, orderId: string): Promise<void> {
  const { db, roomId, now, today, actorId, currency } = scope;
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  const lines = await lineRows(scope, [orderId]);
  const money = await moneyOfOrder(
    scope,
    order,
    lines.map(({ cents }) => cents),
  );
  const room = await db.selectFrom('room').where('id', '=', roomId).select(['name', 'place']).executeTakeFirstOrThrow();
  const by = await db.selectFrom('account').where('id', '=', actorId).select('name').executeTakeFirstOrThrow();
  const content: ReceiptContent = {
    number: order.number,
    issuedOn: today,
    roomName: room.name,
    place: room.place,
    currency,
    by: by.name,
    way: ORDER_WAY_WORDS[order.way],
    lines: row.lines.map(({ heads, code, speciesName, locality, cents }) => ({
      heads,
      code,
      what: [speciesName, locality].filter(Boolean).join(', '),
      cents: cents ?? 0,
    })),
    discountCents: order.discountCents,
    totalCents: money.totalCents,
    payments: (await paymentsOf(scope, [orderId]))
      .filter(({ needsRefund, refunds }) => !needsRefund && refunds === null)
      .map(({ kind, method, onDay, cents }) => ({
        words: `${PAYMENT_KIND_WORDS[kind]}, ${PAYMENT_METHOD_WORDS[method]}`,
        onDay,
        cents,
      })),
    toPayCents: money.toPayCents,
    sheets: (await sheetsOf(scope, row)).map(({ number }) => number),
  };
  await db
    .insertInto('receipt')
    .values({
      roomId,
      id: newId(now),
      purchaseId: orderId,
      content: JSON.stringify(content),
      issuedOn: today,
      createdAt: now,
    })
    .execute();
}

export async function hasReceipt({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>, orderId: string): Promise<boolean> {
  const row = await db
    .selectFrom('receipt')
    .where('roomId', '=', roomId)
    .where('purchaseId', '=', orderId)
    .select('id')
    .executeTakeFirst();
  return row !== undefined;
}

export async function sendReceipt(
  { db, roomId }: RoomAsked,
  orderId: string,
  paper: Paper,
  res: Response,
): Promise<null> {
  const row = await db
    .selectFrom('receipt')
    .innerJoin('purchase', (join) =>
      join.onRef('purchase.roomId', '=', 'receipt.roomId').onRef('purchase.id', '=', 'receipt.purchaseId'),
    )
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'purchase.roomId').onRef('buyer.id', '=', 'purchase.buyerId'),
    )
    .where('receipt.roomId', '=', roomId)
    .where('receipt.purchaseId', '=', orderId)
    .select(['receipt.content', 'buyer.name'])
    .executeTakeFirst();
  if (!row) throw notFound('That receipt');
  const content = ReceiptContent.parse(JSON.parse(row.content));
  res.set({
    'Content-Type': 'application/pdf',
    'Content-Disposition': `inline; filename="receipt-${content.number}.pdf"`,
    'Cache-Control': 'private, no-store',
  });
  res.send(await receiptPdf(content, row.name, paper));
  return null;
}
