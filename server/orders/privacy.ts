import type { Response } from 'express';
import { isOpen } from '../../shared/orders/state';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import type { Scope } from '../scope';
import { messagesOf } from './change';
import { paymentsOf } from './ledger';
import { sheetsOf } from './letters';
import { EVERYTHING } from './room';
import { orderRows } from './rows';

async function buyerRow({ db, roomId }: Scope, buyerId: string) {
  const buyer = await db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where('id', '=', buyerId)
    .selectAll()
    .executeTakeFirst();
  if (!buyer) throw notFound('That buyer');
  return buyer;
}

/** Everything that is held about a buyer, as one file. */
export async function sendBuyer(scope: Scope, buyerId: string, res: Response): Promise<null> {
  const { db, roomId, today } = scope;
  const { roomId: _room, version: _version, ...buyer } = await buyerRow(scope, buyerId);
  const requests = await db
    .selectFrom('request')
    .where('roomId', '=', roomId)
    .where('buyerId', '=', buyerId)
    .select(['id', 'kind', 'heads', 'lengthTenthsMm', 'words', 'state', 'createdAt', 'confirmedAt'])
    .execute();
  const orders = [];
  for (const { unread: _unread, buyer: _buyer, ...order } of await orderRows(scope, EVERYTHING, { buyerId })) {
    orders.push({
      ...order,
      messages: await messagesOf(scope, order.id),
      payments: (await paymentsOf(scope, [order.id])).map(({ kind, method, cents, onDay }) => ({
        kind,
        method,
        cents,
        onDay,
      })),
      sheets: (await sheetsOf(scope, order)).map(({ number }) => number),
    });
  }
  const letters = await db
    .selectFrom('letter')
    .where('roomId', '=', roomId)
    .where('toAddress', '=', buyer.email ?? '')
    .select(['kind', 'subject', 'createdAt', 'sentAt'])
    .execute();
  res.set({
    'Content-Type': 'application/json; charset=utf-8',
    'Content-Disposition': `attachment; filename="buyer-${today}.json"`,
    'Cache-Control': 'private, no-store',
  });
  res.send(JSON.stringify({ writtenOn: today, buyer, requests, orders, letters }, null, 2));
  return null;
}

/** Takes the person out: what is left are numbers of orders, money and sheets, which the books and the buyers of fish need. */
export async function erase(scope: Scope, buyerId: string): Promise<void> {
  const { db, roomId, now } = scope;
  const buyer = await buyerRow(scope, buyerId);
  if (buyer.erasedAt) throw new Refusal('conflict', 'This buyer is erased already');
  const orders = await orderRows(scope, EVERYTHING, { buyerId });
  const open = orders.find(({ state, flaggedCents }) => isOpen(state) || (flaggedCents ?? 0) > 0);
  if (open) throw new Refusal('conflict', `Order ${open.number} is still open: close or cancel it first`);
  const ids = orders.map(({ id }) => id);
  if (ids.length > 0) {
    await db.deleteFrom('message').where('roomId', '=', roomId).where('purchaseId', 'in', ids).execute();
    await db
      .updateTable('purchase')
      .set({ note: null, cancelledBecause: null })
      .where('roomId', '=', roomId)
      .where('id', 'in', ids)
      .execute();
  }
  await db
    .updateTable('request')
    .set({ words: null, state: 'closed' })
    .where('roomId', '=', roomId)
    .where('buyerId', '=', buyerId)
    .execute();
  // The outbox keeps copies, to this address or about these orders.
  await db
    .deleteFrom('letter')
    .where('roomId', '=', roomId)
    .where((eb) => eb.or([eb('toAddress', '=', buyer.email ?? ''), eb('aboutId', 'in', ids)]))
    .execute();
  await db
    .updateTable('buyer')
    .set({
      ...{ accountId: null, email: null, phone: null, address: null, note: null, emailConfirmedAt: null },
      name: 'Erased buyer',
      erasedAt: now,
    })
    .where('roomId', '=', roomId)
    .where('id', '=', buyerId)
    .execute();
  await audit(scope, { action: 'buyer erased', about: 'buyer', aboutId: buyerId });
}
