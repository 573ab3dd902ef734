import type * as z from 'zod/mini';
import { formatMoney } from '../../shared/money';
import type { agreeTime, changeOrder, MessageDraft, offerTimes } from '../../shared/orders/contract';
import { hasLeft } from '../../shared/orders/state';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import type { RoomAsked, Scope } from '../scope';
import { writeOrderLetter } from './letters';
import { type Acting, EVERYTHING } from './room';
import { oneOrder } from './rows';
import { changeStored, mustBeSeen, type StoredOrder, storedOrder } from './stored';

async function seen(scope: Scope, orderId: string, version: number) {
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  mustBeSeen(order, version, row);
  return { order, row };
}

export async function changeOne(scope: Scope, orderId: string, body: z.output<typeof changeOrder.body>) {
  const { order, row } = await seen(scope, orderId, body.version);
  const { discountCents, note } = body;
  const lines = row.lines.reduce((sum, { cents }) => sum + (cents ?? 0), 0);
  if (discountCents > lines)
    throw new Refusal('invalid', 'The discount is more than the price', {
      discountCents: `At most ${formatMoney(lines, scope.currency)}`,
    });
  if (order.state === 'cancelled' || order.state === 'closed')
    throw new Refusal('conflict', 'This order is closed: it stays as it is');
  await changeStored(scope, orderId, { discountCents, note });
  const change = { discountCents: [order.discountCents, discountCents] as [number, number] };
  await audit(scope, { action: 'order changed', about: 'order', aboutId: orderId, change });
  return oneOrder(scope, EVERYTHING, orderId);
}

export async function offer(scope: Scope, orderId: string, body: z.output<typeof offerTimes.body>) {
  const { order } = await seen(scope, orderId, body.version);
  mustStillLeave(order);
  const times = [...new Set(body.times)].sort();
  const past = times.findIndex((time) => time.slice(0, 10) < scope.today);
  if (past >= 0) throw new Refusal('invalid', 'A time is in the past', { [`times.${past}`]: 'Choose a day to come' });
  await changeStored(scope, orderId, { offeredTimes: JSON.stringify(times) });
  await audit(scope, { action: 'times offered', about: 'order', aboutId: orderId });
  return oneOrder(scope, EVERYTHING, orderId);
}

export async function agree(scope: Scope, orderId: string, body: z.output<typeof agreeTime.body>) {
  const { order } = await seen(scope, orderId, body.version);
  await setTime(scope, order, body.time);
  return oneOrder(scope, EVERYTHING, orderId);
}

export async function setTime(scope: Acting, order: StoredOrder, time: string | null): Promise<void> {
  mustStillLeave(order);
  if (time && time.slice(0, 10) < scope.today)
    throw new Refusal('invalid', 'That time is past', { time: 'Choose a time to come' });
  await changeStored(scope, order.id, { agreedTime: time });
  await audit(scope, { action: time ? 'time agreed' : 'time opened again', about: 'order', aboutId: order.id });
  if (time && time !== order.agreedTime) await writeOrderLetter(scope, order.id, 'timeAgreed');
}

function mustStillLeave({ state }: StoredOrder): void {
  if (state === 'cancelled' || hasLeft(state))
    throw new Refusal('conflict', 'The fish of this order are not waiting any more');
}

export const offeredTimesOf = ({ offeredTimes }: { offeredTimes: string }): string[] => {
  const times: unknown = JSON.parse(offeredTimes);
  return Array.isArray(times) ? times.map(String) : [];
};

/** One more message of the thread; a buyer hears of ours by letter, ours shows theirs as unread. */
export async function addMessage(
  scope: Acting,
  orderId: string,
  draft: z.output<typeof MessageDraft>,
  fromBuyer: boolean,
) {
  const { db, roomId, now, actorId = null } = scope;
  await storedOrder(scope, orderId);
  await db
    .insertInto('message')
    .values({
      roomId,
      id: draft.id,
      purchaseId: orderId,
      fromBuyer: fromBuyer ? 1 : 0,
      actorId,
      body: draft.body,
      at: now,
      readAt: null,
    })
    .execute();
  if (!fromBuyer) await writeOrderLetter(scope, orderId, 'message', { message: draft.body });
  const message = (await messagesOf(scope, orderId)).find(({ id }) => id === draft.id);
  if (!message) throw notFound('That message');
  return message;
}

export async function messagesOf({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>, orderId: string) {
  const rows = await db
    .selectFrom('message')
    .leftJoin('account', 'account.id', 'message.actorId')
    .where('message.roomId', '=', roomId)
    .where('message.purchaseId', '=', orderId)
    .select(['message.id', 'message.fromBuyer', 'message.body', 'message.at', 'account.name as by'])
    .orderBy('message.at')
    .orderBy('message.id')
    .execute();
  return rows.map(({ fromBuyer, ...row }) => ({ ...row, fromBuyer: fromBuyer === 1 }));
}

export async function readMessages({ db, roomId, now }: Scope, orderId: string): Promise<void> {
  await storedOrder({ db, roomId }, orderId);
  await db
    .updateTable('message')
    .set({ readAt: now })
    .where('roomId', '=', roomId)
    .where('purchaseId', '=', orderId)
    .where('fromBuyer', '=', 1)
    .where('readAt', 'is', null)
    .execute();
}
