import { Refusal } from '../../shared/refusal';
import { freeHeads } from '../broods';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { touchRooms } from '../db/touchRooms';
import type { Asked } from '../scope';
import { bookPayment } from './ledger';
import { writeOrderLetter } from './letters';
import { lineRows } from './lines';
import { afterMoney } from './payments';
import { type Acting, EVERYTHING, roomAsked } from './room';
import { oneOrder } from './rows';
import type { Session } from './session';
import { storedOrder } from './stored';

/**
 * What a message of the card service changes: the first that says paid books the money, the first that says it never will
 * frees the fish, all others nothing. Inside a transaction; answers what was done.
 */
export async function settle(asked: Asked, type: string, session: Session): Promise<string> {
  const checkout = await asked.db
    .selectFrom('checkout')
    .where('outsideId', '=', session.id)
    .selectAll()
    .executeTakeFirst();
  // The account at the card service may sell other things too.
  if (!checkout) return 'not ours';
  const { roomId, purchaseId } = checkout;
  if (session.metadata?.['roomId'] !== roomId || session.metadata['orderId'] !== purchaseId) {
    asked.log.warn({ event: 'webhook', outcome: 'refused', roomId }, 'a message for another order');
    throw new Refusal('malformed', 'This message is not for that order');
  }
  const scope = await roomAsked(asked, roomId);
  if (checkout.state === 'paid') return 'paid already';
  const gone = type === 'checkout.session.expired' || type === 'checkout.session.async_payment_failed';
  if (gone) return checkout.state === 'open' ? free(scope, checkout) : 'known already';
  if (session.payment_status !== 'paid') return 'not paid yet';
  return paid(scope, checkout, session);
}

type Checkout = { id: string; purchaseId: string; kind: 'deposit' | 'balance'; cents: number; state: string };

async function ends(scope: Acting, id: string, state: 'paid' | 'expired'): Promise<void> {
  const { db, roomId } = scope;
  await db.updateTable('checkout').set({ state }).where('roomId', '=', roomId).where('id', '=', id).execute();
  await touchRooms(db, [roomId]);
}

/** Never paid: the fish of an order that waits for this money are free again. What is paid for stays held. */
async function free(scope: Acting, { id, purchaseId }: Checkout): Promise<string> {
  await ends(scope, id, 'expired');
  const order = await storedOrder(scope, purchaseId);
  if (order.state !== 'depositAsked' && order.state !== 'reserved') return 'nothing to free';
  const lines = await lineRows(scope, [purchaseId]);
  await freeHeads(
    scope,
    lines.map((line) => line.id),
  );
  await audit(scope, { action: 'payment not made, fish free', about: 'order', aboutId: purchaseId });
  return 'freed';
}

async function paid(scope: Acting, checkout: Checkout, session: Session): Promise<string> {
  const { purchaseId, cents, kind } = checkout;
  const order = await storedOrder(scope, purchaseId);
  const row = await oneOrder(scope, EVERYTHING, purchaseId);
  const wrong = wrongWith(scope, checkout, session);
  const late =
    row.lapsed || order.state === 'cancelled' || order.state === 'requested' || cents > (row.toPayCents ?? 0);
  await ends(scope, checkout.id, 'paid');
  const booked = await bookPayment(scope, order, {
    id: newId(scope.now),
    kind,
    method: 'card',
    cents: session.amount_total || cents,
    onDay: scope.today,
    outsideId: session.payment_intent ?? session.id,
    needsRefund: wrong !== null || late,
    note: wrong ?? (late ? 'Came too late: the fish were not held any more' : null),
  });
  if (!booked) return 'paid already';
  if (wrong !== null || late) {
    await audit(scope, { action: 'payment to give back', about: 'order', aboutId: purchaseId });
    return wrong === null ? 'too late' : 'not as asked';
  }
  await audit(scope, { action: 'payment by card', about: 'order', aboutId: purchaseId });
  await afterMoney(scope, order);
  await writeOrderLetter(scope, purchaseId, 'received', { cents });
  return 'paid';
}

/** Another amount or currency than was asked pays for nothing; an owner looks at it. */
function wrongWith({ currency }: Acting, { cents }: Checkout, session: Session): string | null {
  if (session.currency?.toUpperCase() !== currency)
    return `Came in ${session.currency?.toUpperCase() ?? 'no currency'}, not in ${currency}`;
  if (session.amount_total !== cents) return 'Another amount than was asked';
  return null;
}
