import type { Response } from 'express';
import type * as z from 'zod/mini';
import { dayOf } from '../../shared/days';
import { PAYMENT_KIND_WORDS, PAYMENT_METHOD_WORDS } from '../../shared/orders/money';
import type { listOwnOrders, OwnOrder } from '../../shared/orders/own';
import { TRANSPORT_CAUTIONS } from '../../shared/orders/packing';
import { notFound, Refusal } from '../../shared/refusal';
import { inTransaction } from '../http/serve';
import { hashOfToken, tokenOf } from '../mail/tokens';
import type { Asked, RoomAsked, SignedIn } from '../scope';
import { addMessage, messagesOf, offeredTimesOf, setTime } from './change';
import { payNow } from './checkout';
import { moneyOfOrder, paymentsOf } from './ledger';
import { sheetsOf, whatOf } from './letters';
import { lineRows } from './lines';
import { callOff } from './moves';
import { hasReceipt } from './receipt';
import { EVERYTHING, roomAsked } from './room';
import { oneOrder, orderRows } from './rows';
import { storedOrder } from './stored';
import { termsOf } from './terms';

type Own = { scope: RoomAsked; orderId: string };

/** By the link in a letter. Without a fishroom in the query, since the token names one row of all; the page is never indexed. */
export async function ownOrder(asked: Asked, token: string, res: Response): Promise<Own> {
  res.set({ 'X-Robots-Tag': 'noindex', 'Referrer-Policy': 'no-referrer' });
  const found = await asked.db
    .selectFrom('purchase')
    .where('tokenHash', '=', hashOfToken(token))
    .select(['roomId', 'id'])
    .executeTakeFirst();
  if (!found) throw notFound('That order');
  return { scope: await roomAsked(asked, found.roomId), orderId: found.id };
}

/** The buyer's own order and nothing else: no other order, no keeper's note, no tank. */
export async function ownPage({ scope, orderId }: Own): Promise<z.input<typeof OwnOrder>> {
  const { db, roomId, currency, today, house } = scope;
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  const room = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select(['name', 'place', 'slug'])
    .executeTakeFirstOrThrow();
  const lines = await lineRows(scope, [orderId]);
  const money = await moneyOfOrder(
    scope,
    order,
    lines.map(({ cents }) => cents),
  );
  const { state, way, number, depositCents, discountCents, termsText, agreedTime } = order;
  return {
    room: { ...room, currency },
    today,
    number,
    buyerName: row.buyer?.code ?? '',
    state,
    way,
    lapsed: row.lapsed,
    hasDeposit: row.hasDeposit,
    // What falls short is for the fishroom to say in its own words; its notes on a line are its own.
    lines: row.lines.map((line) => ({ ...line, short: 0, note: null })),
    discountCents,
    totalCents: money.totalCents,
    receivedCents: money.receivedCents,
    toPayCents: money.toPayCents,
    depositCents,
    payments: (await paymentsOf(scope, [orderId])).map(({ kind, method, cents, onDay }) => ({
      kind: PAYMENT_KIND_WORDS[kind],
      method: PAYMENT_METHOD_WORDS[method],
      cents,
      onDay,
    })),
    payNow: house.payments ? payNow(row, order) : null,
    bank: (await termsOf(scope)).bank,
    reservedUntil: row.reservedUntil,
    offeredTimes: offeredTimesOf(order).filter((time) => time.slice(0, 10) >= today),
    agreedTime,
    mayCancel: ownMayCancel(state, money.receivedCents),
    termsText,
    cautions: TRANSPORT_CAUTIONS,
    messages: (await messagesOf(scope, orderId)).map((message) => ({ ...message, by: null })),
    sheets: (await sheetsOf(scope, row))
      .filter(({ linkRevoked }) => !linkRevoked)
      .map(({ id, number: issue, token, subject }) => ({ id, number: issue, token, code: subject.code })),
    hasReceipt: await hasReceipt(scope, orderId),
  };
}

const ownMayCancel = (state: string, receivedCents: number): boolean =>
  receivedCents === 0 && (state === 'requested' || state === 'reserved' || state === 'depositAsked');

/** A time that the fishroom offered. */
export function pickTime(own: Own, time: string) {
  return inTransaction(own.scope, async (scope) => {
    const order = await storedOrder(scope, own.orderId);
    if (!offeredTimesOf(order).includes(time))
      throw new Refusal('conflict', 'That time is not offered any more', { time: 'Choose one that is offered' });
    await setTime(scope, order, time);
    return ownPage({ ...own, scope });
  });
}

/** As many as a conversation needs, too few to fill a disk. */
const MESSAGES_A_DAY = 40;

export function writeMessage(own: Own, draft: { id: string; body: string }) {
  return inTransaction(own.scope, async (scope) => {
    const since = new Date(Date.parse(scope.now) - 86_400_000).toISOString();
    const today = (await messagesOf(scope, own.orderId)).filter(({ fromBuyer, at }) => fromBuyer && at > since);
    if (today.length >= MESSAGES_A_DAY)
      throw new Refusal('too-many', 'That is enough for one day', {}, { retryAfter: 3600 });
    await addMessage(scope, own.orderId, draft, true);
    return ownPage({ ...own, scope });
  });
}

export function cancelOwn(own: Own, because: string) {
  return inTransaction(own.scope, async (scope) => {
    const order = await storedOrder(scope, own.orderId);
    const page = await ownPage({ ...own, scope });
    if (!page.mayCancel)
      throw new Refusal('conflict', 'This order can’t be cancelled here any more: write to the fishroom');
    await callOff(scope, order, because);
    return ownPage({ ...own, scope });
  });
}

/** The orders of an account's confirmed address, in every fishroom: without one, as every other line is asked. */
export async function ownOrders(asked: SignedIn): Promise<z.input<typeof listOwnOrders.output>> {
  const account = await asked.db
    .selectFrom('account')
    .where('id', '=', asked.accountId)
    .select(['emailFolded', 'emailVerifiedAt'])
    .executeTakeFirstOrThrow();
  if (!account.emailVerifiedAt) return { orders: [] };
  const found = await asked.db
    .selectFrom('purchase')
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'purchase.roomId').onRef('buyer.id', '=', 'purchase.buyerId'),
    )
    .innerJoin('room', 'room.id', 'purchase.roomId')
    .where((eb) =>
      eb.or([
        eb('buyer.accountId', '=', asked.accountId),
        eb(eb.fn<string>('lower', ['buyer.email']), '=', account.emailFolded),
      ]),
    )
    .select([
      'purchase.id',
      'purchase.roomId',
      'purchase.number',
      'purchase.state',
      'purchase.createdAt',
      'purchase.agreedTime',
      'room.name as roomName',
    ])
    .orderBy('purchase.createdAt', 'desc')
    .limit(200)
    .execute();
  const orders = [];
  for (const { id, roomId, roomName, number, state, createdAt, agreedTime } of found) {
    const scope = await roomAsked(asked, roomId);
    const [row] = await orderRows(scope, EVERYTHING, { ids: [id] });
    const token = tokenOf(asked.house.config, id);
    const madeOn = dayOf(Date.parse(createdAt), scope.timeZone);
    orders.push({ id, token, roomName, number, state, madeOn, agreedTime, what: row ? whatOf(row) : '' });
  }
  return { orders };
}
