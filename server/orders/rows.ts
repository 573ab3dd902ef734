import type * as z from 'zod/mini';
import { dayOf } from '../../shared/days';
import { moneyOf } from '../../shared/orders/money';
import type { OrderLine, OrderRow } from '../../shared/orders/shapes';
import { shortfalls } from '../../shared/orders/shortfall';
import { isHoldingState } from '../../shared/orders/state';
import { notFound } from '../../shared/refusal';
import { broodRows, claimsOf } from '../broods';
import type { RoomAsked } from '../scope';
import { paymentsOf } from './ledger';
import { lineRows, type StoredLine } from './lines';
import type { Sees } from './room';

type Told = z.input<typeof OrderRow>;
export type Which = { ids?: string[]; openOnly?: boolean; buyerId?: string };

type Known = {
  broods: Map<string, Awaited<ReturnType<typeof broodRows>>[number]>;
  claims: Awaited<ReturnType<typeof claimsOf>>;
  short: Map<string, number>;
};

/** Orders with what their lines, reservations and payments say now, newest first. */
export async function orderRows(scope: RoomAsked, sees: Sees, which: Which = {}): Promise<Told[]> {
  const orders = await storedOrders(scope, which);
  const ids = orders.map(({ id }) => id);
  const lines = await lineRows(scope, ids);
  const payments = await paymentsOf(scope, ids);
  const unread = await unreadOf(scope);
  const known = await knownOf(scope, lines);
  return orders.map((order) => {
    const own = lines.filter(({ purchaseId }) => purchaseId === order.id);
    const { state, way, discountCents } = order;
    const paid = payments.filter(({ purchaseId }) => purchaseId === order.id);
    const money = moneyOf({ state, way, discountCents, lineCents: own.map(({ cents }) => cents), payments: paid });
    const told = own.map((line) => lineTold(line, known, sees));
    const held = known.claims.filter(({ purchaseLineId }) => own.some(({ id }) => id === purchaseLineId));
    const cents = (amount: number) => (sees.money ? amount : null);
    return {
      id: order.id,
      version: order.version,
      number: order.number,
      state,
      way,
      lapsed:
        isHoldingState(state) &&
        own.some((line) => line.broodId && !held.some((one) => one.purchaseLineId === line.id)),
      hasDeposit: order.depositCents !== null,
      buyer: sees.buyer ? { id: order.buyerId, code: order.buyerName } : null,
      lines: told,
      agreedTime: order.agreedTime,
      reservedUntil: held.map(({ until }) => until).sort()[0] ?? null,
      madeOn: dayOf(Date.parse(order.createdAt), scope.timeZone),
      handedOverAt: order.handedOverAt,
      short: told.reduce((sum, line) => sum + line.short, 0),
      totalCents: cents(money.totalCents),
      toPayCents: cents(money.toPayCents),
      toReturnCents: cents(money.toReturnCents),
      flaggedCents: cents(money.flaggedCents),
      unread: sees.buyer ? (unread.get(order.id) ?? 0) : null,
    };
  });
}

export async function oneOrder(scope: RoomAsked, sees: Sees, orderId: string): Promise<Told> {
  const [order] = await orderRows(scope, sees, { ids: [orderId] });
  if (!order) throw notFound('That order');
  return order;
}

async function storedOrders({ db, roomId }: RoomAsked, { ids, openOnly, buyerId }: Which) {
  let query = db
    .selectFrom('purchase')
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'purchase.roomId').onRef('buyer.id', '=', 'purchase.buyerId'),
    )
    .where('purchase.roomId', '=', roomId)
    .selectAll('purchase')
    .select('buyer.name as buyerName');
  if (ids) query = query.where('purchase.id', 'in', ids);
  if (buyerId) query = query.where('purchase.buyerId', '=', buyerId);
  if (openOnly) query = query.where('purchase.state', 'not in', ['closed', 'cancelled']);
  return query.orderBy('purchase.number', 'desc').execute();
}

async function knownOf(scope: RoomAsked, lines: StoredLine[]): Promise<Known> {
  const broodIds = [...new Set(lines.flatMap(({ broodId }) => broodId ?? []))];
  const broods = broodIds.length > 0 ? await broodRows(scope, { ids: broodIds }) : [];
  const claims = await claimsOf(scope);
  const short = new Map<string, number>();
  for (const { id, heads } of broods) {
    const own = claims
      .filter(({ broodId }) => broodId === id)
      .map((claim) => ({ id: claim.purchaseLineId ?? claim.id, heads: claim.heads }));
    for (const [lineId, missing] of shortfalls(Math.floor(heads + 1e-9), own)) short.set(lineId, missing);
  }
  return { broods: new Map(broods.map((brood) => [brood.id, brood])), claims, short };
}

function lineTold(line: StoredLine, { broods, short }: Known, sees: Sees): z.input<typeof OrderLine> {
  const brood = broods.get(line.broodId ?? '');
  const { id, broodId, fishId, lot, heads, lostHeads, returnedHeads, note } = line;
  return {
    id,
    broodId,
    fishId,
    code: brood?.code ?? line.fishCode ?? 'a fish',
    speciesName: brood?.displayName ?? line.speciesName,
    locality: brood?.locality ?? line.locality,
    lot,
    heads,
    lostHeads,
    returnedHeads,
    note,
    lengthTenthsMm: brood?.lastSample ? Math.round(brood.lastSample.meanTenthsMm) : null,
    measuredOn: brood?.lastSample?.onDay ?? null,
    short: short.get(id) ?? 0,
    cents: sees.money ? line.cents : null,
  };
}

async function unreadOf({ db, roomId }: RoomAsked): Promise<Map<string, number>> {
  const rows = await db
    .selectFrom('message')
    .where('roomId', '=', roomId)
    .where('fromBuyer', '=', 1)
    .where('readAt', 'is', null)
    .select(['purchaseId', ({ fn }) => fn.countAll<number>().as('count')])
    .groupBy('purchaseId')
    .execute();
  return new Map(rows.map(({ purchaseId, count }) => [purchaseId, Number(count)]));
}
