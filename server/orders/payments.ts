import type * as z from 'zod/mini';
import { formatMoney } from '../../shared/money';
import type { giveBack, recordPayment } from '../../shared/orders/contract';
import { refundableOf } from '../../shared/orders/money';
import { afterMove } from '../../shared/orders/state';
import { Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { inTransaction } from '../http/serve';
import type { Scope } from '../scope';
import { bookPayment, paymentsOf } from './ledger';
import { writeOrderLetter } from './letters';
import { becomes } from './moves';
import { type Acting, EVERYTHING } from './room';
import { oneOrder } from './rows';
import { type StoredOrder, storedOrder } from './stored';

/** What money that arrived does to its order: the deposit, or enough without one, holds the fish until they leave. */
export async function afterMoney(scope: Acting, order: StoredOrder): Promise<void> {
  const row = await oneOrder(scope, EVERYTHING, order.id);
  const received = (row.totalCents ?? 0) - (row.toPayCents ?? 0);
  const next = afterMove(row, 'payDeposit');
  if (next && received > 0 && received >= Math.min(order.depositCents ?? Number.POSITIVE_INFINITY, row.totalCents ?? 0))
    await becomes(scope, order, next);
}

/** Cash or a bank transfer, written down by the owner. */
export async function bookByHand(scope: Scope, orderId: string, body: z.output<typeof recordPayment.body>) {
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  const toPay = row.toPayCents ?? 0;
  if (order.state === 'cancelled' || row.lapsed)
    throw new Refusal('conflict', 'No fish are held for this order: reserve them first');
  if (body.onDay > scope.today) throw new Refusal('invalid', 'That day is still to come', { onDay: 'Not after today' });
  if (body.cents > toPay) {
    const words = formatMoney(toPay, scope.currency);
    throw new Refusal('conflict', `Only ${words} is to pay`, { cents: `At most ${words}` });
  }
  await bookPayment(scope, order, body);
  await audit(scope, { action: 'payment booked', about: 'order', aboutId: orderId });
  await afterMoney(scope, order);
  await writeOrderLetter(scope, orderId, 'received', { cents: body.cents });
  return oneOrder(scope, EVERYTHING, orderId);
}

/** Money back. By card the service is asked first, outside any transaction, with the refund's own id so that it pays once. */
export async function payBack(scope: Scope, orderId: string, body: z.output<typeof giveBack.body>) {
  const payment = await refundable(scope, orderId, body);
  const metadata = { roomId: scope.roomId, orderId, refundId: body.id };
  const outsideId =
    payment.method === 'card' && payment.outsideId
      ? await askBack(scope, payment.outsideId, body, metadata)
      : undefined;
  return inTransaction(scope, async (inside) => {
    if (!outsideId) await refundable(inside, orderId, body);
    const booked = await bookPayment(
      inside,
      { id: orderId },
      {
        id: body.id,
        kind: body.because,
        method: payment.method,
        cents: -body.cents,
        onDay: scope.today,
        refunds: body.paymentId,
        note: body.note,
        ...(outsideId ? { outsideId } : {}),
      },
    );
    if (booked) {
      await audit(inside, { action: 'money given back', about: 'order', aboutId: orderId });
      await writeOrderLetter(inside, orderId, 'refunded', { cents: body.cents });
    }
    return oneOrder(inside, EVERYTHING, orderId);
  });
}

async function refundable(scope: Scope, orderId: string, body: z.output<typeof giveBack.body>) {
  const order = await storedOrder(scope, orderId);
  const all = await paymentsOf(scope, [order.id]);
  const payment = all.find(({ id }) => id === body.paymentId);
  if (!payment) throw new Refusal('invalid', 'That payment was not found', { paymentId: 'Choose a payment' });
  if (all.some(({ id }) => id === body.id)) throw new Refusal('conflict', 'This money has been given back already');
  const left = refundableOf(payment, all);
  if (body.cents > left) {
    const words = formatMoney(left, scope.currency);
    throw new Refusal('conflict', `Only ${words} of it is left`, { cents: `At most ${words}` });
  }
  return payment;
}

async function askBack(
  { house, log }: Scope,
  payment: string,
  { id, cents }: { id: string; cents: number },
  metadata: Record<string, string>,
): Promise<string> {
  if (!house.payments) throw new Refusal('conflict', 'Card payment is not set up here: give it back by hand');
  try {
    return await house.payments.giveBack({ key: id, payment, cents, metadata });
  } catch (error) {
    log.error({ err: error, event: 'refund', outcome: 'failed' }, 'the card service refused a refund');
    throw new Refusal(
      'busy',
      'The card service did not give the money back. Nothing was booked. Try again.',
      {},
      { retryAfter: 30 },
    );
  }
}
