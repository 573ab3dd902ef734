import { Refusal } from '../../shared/refusal';
import { newId } from '../db/newId';
import { inTransaction } from '../http/serve';
import type { RoomAsked } from '../scope';
import { EVERYTHING } from './room';
import { oneOrder } from './rows';
import { type StoredOrder, storedOrder } from './stored';

/** The card service keeps a page open for half an hour at least and a day at most (Stripe API reference, `expires_at`). */
const LEAST_MS = 31 * 60_000;
const MOST_MS = 23 * 3_600_000;

export type PayNow = { kind: 'deposit' | 'balance'; cents: number };

/** What a buyer can pay by card now: the deposit while it is asked, else what is left once the fish are held. */
export function payNow(row: Awaited<ReturnType<typeof oneOrder>>, order: StoredOrder): PayNow | null {
  const toPay = row.toPayCents ?? 0;
  if (row.lapsed || toPay === 0 || order.state === 'requested' || order.state === 'cancelled') return null;
  if (order.state === 'depositAsked') return { kind: 'deposit', cents: Math.min(toPay, order.depositCents ?? toPay) };
  return { kind: 'balance', cents: toPay };
}

/** Where to pay. A page that is still open is answered again, so that two taps do not pay twice. */
export async function checkoutOf(scope: RoomAsked, orderId: string, token: string): Promise<{ url: string }> {
  const { house, log, now } = scope;
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  const due = payNow(row, order);
  if (!due) throw new Refusal('conflict', 'There is nothing to pay for this order now');
  if (!house.payments) throw new Refusal('conflict', 'This fishroom takes no cards: pay by transfer or in cash');
  const earlier = await checkoutsOf(scope, orderId);
  const open = openOne(earlier, due, now);
  if (open) return { url: open.url };
  const end = Math.min(Date.parse(row.reservedUntil ?? '9999-12-31'), Date.parse(now) + MOST_MS);
  const asked = {
    key: `${orderId}-${due.kind}-${due.cents}-${earlier.length}`,
    cents: due.cents,
    currency: scope.currency,
    title: `Order ${order.number}, ${due.kind === 'deposit' ? 'deposit' : 'payment'}`,
    email: await emailOf(scope, order.buyerId),
    returnUrl: `${house.config.origin}/order/${token}`,
    expiresAt: new Date(Math.max(Date.parse(now) + LEAST_MS, end)),
    metadata: { roomId: scope.roomId, orderId },
  };
  const session = await house.payments.openCheckout(asked).catch((error: unknown) => {
    log.error({ err: error, event: 'checkout', outcome: 'failed' }, 'the card service opened no page');
    return null;
  });
  if (!session) {
    // Two taps at once: the other one may have opened the page.
    const other = openOne(await checkoutsOf(scope, orderId), due, now);
    if (other) return { url: other.url };
    const words = 'The card service does not answer. Nothing was paid. Try again in a moment.';
    throw new Refusal('busy', words, {}, { retryAfter: 30 });
  }
  await inTransaction(scope, ({ db, roomId }) =>
    db
      .insertInto('checkout')
      .values({
        roomId,
        id: newId(now),
        purchaseId: orderId,
        outsideId: session.id,
        ...due,
        url: session.url,
        state: 'open',
        createdAt: now,
        expiresAt: session.expiresAt.toISOString(),
      })
      .onConflict((clash) => clash.column('outsideId').doNothing())
      .execute(),
  );
  return { url: session.url };
}

type Open = { state: string; kind: string; cents: number; expiresAt: string; url: string };

const openOne = <One extends Open>(all: One[], due: PayNow, now: string): One | undefined =>
  all.find((one) => one.state === 'open' && one.kind === due.kind && one.cents === due.cents && one.expiresAt > now);

function checkoutsOf({ db, roomId }: RoomAsked, orderId: string) {
  return db
    .selectFrom('checkout')
    .where('roomId', '=', roomId)
    .where('purchaseId', '=', orderId)
    .selectAll()
    .orderBy('id')
    .execute();
}

async function emailOf({ db, roomId }: RoomAsked, buyerId: string): Promise<string | null> {
  const row = await db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where('id', '=', buyerId)
    .select('email')
    .executeTakeFirst();
  return row?.email ?? null;
}
