import { addDays } from '../../shared/days';
import { newId } from '../db/newId';
import { hashOfToken, tokenOf } from '../mail/tokens';
import type { Loading } from './load';
import type { Order } from './scenario/shape';

/** Buyers, what is offered, orders with their reservations and payments, the waiting list. The heads that left are in the story. */
export async function loadSales(loading: Loading): Promise<void> {
  await buyersAndListings(loading);
  for (const order of loading.scenario.orders) await oneOrder(loading, order);
  const { db, scenario, roomId, idOf } = loading;
  for (const request of scenario.requests) {
    const { key, buyer, madeOn, heads, lengthTenthsMm, words, kind } = request;
    const at = `${madeOn}T09:00:00.000Z`;
    await db
      .insertInto('request')
      .values({
        roomId,
        id: idOf(key),
        buyerId: idOf(buyer),
        kind,
        broodId: request.kind === 'fish' ? idOf(request.brood) : null,
        strainId: request.kind === 'notice' ? idOf(request.strain) : null,
        heads,
        lengthTenthsMm,
        words,
        state: 'waiting',
        createdAt: at,
        confirmedAt: at,
        notifiedAt: null,
      })
      .execute();
  }
}

async function buyersAndListings({ db, scenario, roomId, idOf, nowMs }: Loading): Promise<void> {
  const createdAt = new Date(nowMs).toISOString();
  for (const { key, ...facts } of scenario.buyers) {
    await db
      .insertInto('buyer')
      .values({
        roomId,
        id: idOf(key),
        accountId: null,
        ...facts,
        address: null,
        emailConfirmedAt: createdAt,
        noticesStoppedAt: null,
        erasedAt: null,
        createdAt,
      })
      .execute();
  }
  for (const { brood, classes, note } of scenario.listings) {
    await db
      .insertInto('listing')
      .values({
        roomId,
        id: newId(createdAt),
        broodId: idOf(brood),
        colonyId: null,
        listed: 1,
        classes: JSON.stringify(classes),
        note,
        photoId: null,
      })
      .execute();
  }
}

async function oneOrder({ house, db, roomId, idOf }: Loading, order: Order): Promise<void> {
  const at = `${order.madeOn}T10:00:00.000Z`;
  const id = idOf(order.key);
  const { number, state, handOverAt, depositCents, cancelledBecause } = order;
  const gone = ['collected', 'sent', 'closed'].includes(state);
  await db
    .insertInto('purchase')
    .values({
      roomId,
      id,
      number,
      buyerId: idOf(order.buyer),
      requestId: null,
      state,
      depositCents,
      note: null,
      tokenHash: hashOfToken(tokenOf(house.config, id)),
      agreedTime: handOverAt,
      termsText: null,
      cancelledBecause,
      handedOverAt: gone ? handOverAt : null,
      handedOverBy: gone ? idOf('account:nora') : null,
      createdAt: at,
    })
    .execute();
  for (const { brood, heads, cents } of order.lines) {
    const lineId = newId(at);
    await db
      .insertInto('purchaseLine')
      .values({ roomId, id: lineId, purchaseId: id, broodId: idOf(brood), fishId: null, heads, cents, note: null })
      .execute();
    if (['reserved', 'depositAsked', 'depositPaid', 'ready'].includes(state)) {
      await db
        .insertInto('reservation')
        .values({
          roomId,
          id: newId(at),
          broodId: idOf(brood),
          batchId: null,
          kind: 'order',
          heads,
          purchaseLineId: lineId,
          until: order.reservedUntil ? `${addDays(order.reservedUntil, 1)}T00:00:00.000Z` : null,
          freedAt: null,
          note: null,
          createdAt: at,
          entryId: null,
        })
        .execute();
    }
  }
  for (const { kind, method, cents, on } of order.payments) {
    await db
      .insertInto('payment')
      .values({
        roomId,
        id: newId(at),
        purchaseId: id,
        kind,
        method,
        cents,
        onDay: on,
        at: `${on}T12:00:00.000Z`,
        outsideId: null,
        note: null,
        actorId: idOf('account:nora'),
      })
      .execute();
  }
  for (const { fromBuyer, on, body } of order.messages) {
    await db
      .insertInto('message')
      .values({
        roomId,
        id: newId(at),
        purchaseId: id,
        fromBuyer: fromBuyer ? 1 : 0,
        actorId: fromBuyer ? null : idOf('account:nora'),
        body,
        at: `${on}T11:00:00.000Z`,
        readAt: null,
      })
      .execute();
  }
}
