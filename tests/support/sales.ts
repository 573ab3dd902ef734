import type { StandIn } from '@/server/payments';
import { addOrder, moveOrder, readOrder } from '@/shared/orders/contract';
import { payOwnOrder } from '@/shared/orders/own';
import type { OrderRow } from '@/shared/orders/shapes';
import type { Known } from './accounts';
import { makeId, type TestApp } from './testApp';

/** A buyer with an address, written straight to the database: requests and contacts have tests of their own. */
export async function buyerIn(
  app: TestApp,
  roomId: string,
  name = 'Wanda Prest',
  email: string | null = 'wanda@pond.example',
) {
  const id = makeId();
  await app.house.db
    .insertInto('buyer')
    .values({
      roomId,
      id,
      accountId: null,
      name,
      email,
      phone: '+49 30 1234567',
      address: 'Weir Lane 2',
      note: 'Comes by train',
      emailConfirmedAt: null,
      noticesStoppedAt: null,
      erasedAt: null,
      createdAt: app.house.clock.now().toISOString(),
    })
    .execute();
  return { id, name, email: email ?? '' };
}

/** The brood is offered at 15.00 a fish, 20.00 from 5 cm, a pair for 28.00. */
export async function offered(app: TestApp, roomId: string, broodId: string): Promise<void> {
  await app.house.db
    .insertInto('listing')
    .values({
      roomId,
      id: makeId(),
      broodId,
      colonyId: null,
      listed: 1,
      classes: JSON.stringify([
        { fromTenthsMm: 150, cents: 1500 },
        { fromTenthsMm: 500, cents: 2000 },
      ]),
      lots: JSON.stringify([{ lot: 'pair', heads: 2, cents: 2800 }]),
      note: null,
      photoId: null,
    })
    .execute();
}

export const lineOf = (broodId: string, heads: number, more: object = {}) => ({
  id: makeId(),
  broodId,
  fishId: null,
  lot: 'single',
  heads,
  note: null,
  ...more,
});

export const draftOf = (buyerId: string, lines: object[], more: object = {}) => ({
  id: makeId(),
  buyerId,
  requestId: null,
  way: 'sale',
  lines,
  note: null,
  reserve: true,
  ...more,
});

export type Sale = { app: TestApp; owner: Known; roomId: string; broodId: string; buyerId: string };

/** An order of so many, its fish held. */
export const ordered = ({ owner, roomId, broodId, buyerId }: Sale, heads = 4) =>
  owner.get(addOrder, { params: { roomId }, body: draftOf(buyerId, [lineOf(broodId, heads)]) });

/** An order whose deposit of 20.00 is asked, with the page on which it is paid. */
export async function asked(sale: Sale, heads = 4) {
  const { owner, roomId, app } = sale;
  const made = await ordered(sale, heads);
  await owner.get(moveOrder, {
    params: { roomId, orderId: made.id },
    body: { version: made.version, move: 'askDeposit', depositCents: 2000 },
  });
  const token = await tokenOfOrder(sale, made);
  const { url } = await app.person().get(payOwnOrder, { params: { token } });
  const standIn = standInOf(app);
  const session = standIn.sessions.get(url.split('/').at(-1) ?? '');
  if (!session) throw new Error('No page at the card service');
  return { order: made, token, session, standIn };
}

export function standInOf({ house }: TestApp): StandIn {
  if (!house.standIn) throw new Error('The card service has no stand-in here');
  return house.standIn;
}

export async function tokenOfOrder({ owner, roomId }: Sale, { id }: Pick<OrderRow, 'id'>): Promise<string> {
  const { owner: part } = await owner.get(readOrder, { params: { roomId, orderId: id } });
  return part?.link.split('/').at(-1) ?? '';
}

export const now = async ({ owner, roomId }: Sale, { id }: Pick<OrderRow, 'id'>) =>
  owner.get(readOrder, { params: { roomId, orderId: id } });
