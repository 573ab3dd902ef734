import type * as z from 'zod/mini';
import { formatMoney } from '../../shared/money';
import type { cancelOrder, moveOrder } from '../../shared/orders/contract';
import { afterMove, type OrderMove, type OrderState, refusalOf } from '../../shared/orders/state';
import { termsText } from '../../shared/orders/terms';
import { Refusal } from '../../shared/refusal';
import { freeHeads, holdUntil, reserveHeads } from '../broods';
import { audit } from '../db/audit';
import type { Scope } from '../scope';
import { writeOrderLetter } from './letters';
import { lineRows } from './lines';
import { type Acting, EVERYTHING } from './room';
import { oneOrder } from './rows';
import { changeStored, mustBeSeen, type StoredOrder, storedOrder } from './stored';
import { termsOf } from './terms';

/** The state after a move, or the refusal in words: order of flow is the state machine's, never the caller's. */
export async function mayMove(scope: Acting, orderId: string, move: OrderMove): Promise<OrderState> {
  const row = await oneOrder(scope, EVERYTHING, orderId);
  const next = afterMove(row, move);
  if (next === null) throw new Refusal('conflict', refusalOf(row, move));
  return next;
}

/** Puts an order into a state; what is paid for or ready is held until it leaves. */
export async function becomes(scope: Acting, order: StoredOrder, state: OrderState): Promise<void> {
  const lines = await lineRows(scope, [order.id]);
  const ids = lines.map(({ id }) => id);
  if (state === 'depositPaid' || state === 'ready') await holdUntil(scope, ids, null);
  if (state === 'cancelled') await freeHeads(scope, ids);
  await changeStored(scope, order.id, { state });
  const { id } = order;
  await audit(scope, {
    action: `order ${ACTIONS[state]}`,
    about: 'order',
    aboutId: id,
    change: { state: [order.state, state] },
  });
}

const ACTIONS: Record<OrderState, string> = {
  requested: 'requested',
  reserved: 'reserved',
  depositAsked: 'deposit asked',
  depositPaid: 'deposit paid',
  ready: 'ready',
  collected: 'collected',
  sent: 'sent',
  closed: 'closed',
  cancelled: 'cancelled',
};

/** Holds the heads of every line for as long as the fishroom's terms say, and freezes those terms with the order. */
export async function reserve(scope: Acting, order: StoredOrder): Promise<void> {
  const next = await mayMove(scope, order.id, 'reserve');
  const terms = await termsOf(scope);
  const row = await oneOrder(scope, EVERYTHING, order.id);
  await freeHeads(
    scope,
    row.lines.map(({ id }) => id),
  );
  for (const { fishId } of row.lines) if (fishId) await mustBeFree(scope, fishId, order.id);
  const wanted = row.lines.flatMap(({ id, broodId, heads, code }, i) =>
    broodId ? [{ broodId, heads, code, purchaseLineId: id, field: `lines.${i}.heads` }] : [],
  );
  await reserveHeads(scope, wanted, new Date(Date.parse(scope.now) + terms.holdDays * 86_400_000).toISOString());
  await changeStored(scope, order.id, { termsText: termsText(terms) });
  await becomes(scope, order, next);
  await writeOrderLetter(scope, order.id, 'reserved');
}

/** A single fish is promised once. */
async function mustBeFree({ db, roomId }: Acting, fishId: string, orderId: string): Promise<void> {
  const other = await db
    .selectFrom('purchaseLine')
    .innerJoin('purchase', (join) =>
      join.onRef('purchase.roomId', '=', 'purchaseLine.roomId').onRef('purchase.id', '=', 'purchaseLine.purchaseId'),
    )
    .where('purchaseLine.roomId', '=', roomId)
    .where('purchaseLine.fishId', '=', fishId)
    .where('purchase.id', '!=', orderId)
    .where('purchase.state', 'not in', ['requested', 'cancelled'])
    .select('purchase.number')
    .executeTakeFirst();
  if (other) throw new Refusal('conflict', `This fish is promised in order ${other.number}`);
}

export async function move(scope: Scope, orderId: string, body: z.output<typeof moveOrder.body>) {
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  mustBeSeen(order, body.version, row);
  if (body.move === 'reserve') {
    await reserve(scope, order);
    return oneOrder(scope, EVERYTHING, orderId);
  }
  const next = await mayMove(scope, orderId, body.move);
  switch (body.move) {
    case 'askDeposit': {
      const most = row.totalCents ?? 0;
      if (body.depositCents === null) throw new Refusal('invalid', 'Say how much', { depositCents: 'Type an amount' });
      if (body.depositCents > most)
        throw new Refusal('invalid', 'A deposit is at most the price', {
          depositCents: `At most ${formatMoney(most, scope.currency)}`,
        });
      await changeStored(scope, orderId, { depositCents: body.depositCents });
      break;
    }
    case 'forgoDeposit':
      await changeStored(scope, orderId, { depositCents: null });
      break;
    case 'close':
      if ((row.toPayCents ?? 0) > 0 || (row.flaggedCents ?? 0) > 0)
        throw new Refusal('conflict', 'Money of this order is not settled yet');
      break;
    case 'markReady':
      if (row.short > 0) throw new Refusal('conflict', `${row.short} fish are missing. Change the lines first.`);
      break;
  }
  await becomes(scope, order, next);
  if (body.move === 'askDeposit') await writeOrderLetter(scope, orderId, 'depositAsked');
  if (body.move === 'markReady') await writeOrderLetter(scope, orderId, 'ready');
  return oneOrder(scope, EVERYTHING, orderId);
}

export async function cancel(scope: Scope, orderId: string, body: z.output<typeof cancelOrder.body>) {
  const order = await storedOrder(scope, orderId);
  mustBeSeen(order, body.version, await oneOrder(scope, EVERYTHING, orderId));
  await callOff(scope, order, body.because);
  return oneOrder(scope, EVERYTHING, orderId);
}

/** Cancels and frees the fish. Money that was paid is not moved by this: the order shows what has to go back. */
export async function callOff(scope: Acting, order: StoredOrder, because: string): Promise<void> {
  await mayMove(scope, order.id, 'cancel');
  await becomes(scope, order, 'cancelled');
  await changeStored(scope, order.id, { cancelledBecause: because });
  await writeOrderLetter(scope, order.id, 'cancelled');
}
