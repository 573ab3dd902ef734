import type * as z from 'zod/mini';
import type { changeLine, LineDraft, OrderDraft } from '../../shared/orders/contract';
import { PriceClasses, PriceLots, priceOf } from '../../shared/orders/price';
import { hasLeft, isHoldingState } from '../../shared/orders/state';
import { notFound, Refusal } from '../../shared/refusal';
import { availableOf, broodRows, changeClaim } from '../broods';
import { audit } from '../db/audit';
import { growthOfBrood, sizeTodayOf } from '../growth';
import { hashOfToken, tokenOf } from '../mail/tokens';
import type { Scope } from '../scope';
import { lineRows } from './lines';
import { reserve } from './moves';
import { type Acting, EVERYTHING } from './room';
import { oneOrder } from './rows';
import { changeStored, mustBeSeen, storedOrder } from './stored';

const FIRST_NUMBER = 1001;

/** Writes an order down, prices it, and holds its fish if asked to. All in the caller's transaction. */
export async function makeOrder(scope: Acting, draft: OrderDraft) {
  const { db, roomId, now, house } = scope;
  await mustBeBuyer(scope, draft.buyerId);
  if (draft.requestId) await takeRequest(scope, draft.requestId);
  const last = await db
    .selectFrom('purchase')
    .where('roomId', '=', roomId)
    .select(({ fn }) => fn.max('number').as('number'))
    .executeTakeFirst();
  const { id, buyerId, requestId, way, note } = draft;
  await db
    .insertInto('purchase')
    .values({
      roomId,
      id,
      number: Number(last?.number ?? FIRST_NUMBER - 1) + 1,
      buyerId,
      requestId,
      state: 'requested',
      way,
      note,
      depositCents: null,
      tokenHash: hashOfToken(tokenOf(house.config, id)),
      agreedTime: null,
      termsText: null,
      cancelledBecause: null,
      handedOverAt: null,
      handedOverBy: null,
      createdAt: now,
    })
    .execute();
  for (const [i, line] of draft.lines.entries()) await addLine(scope, { orderId: id, line, i, isGift: way === 'gift' });
  await audit(scope, { action: 'order made', about: 'order', aboutId: id });
  if (draft.reserve) await reserve(scope, await storedOrder(scope, id));
  return oneOrder(scope, EVERYTHING, id);
}

async function mustBeBuyer({ db, roomId }: Acting, buyerId: string): Promise<void> {
  const buyer = await db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where('id', '=', buyerId)
    .where('erasedAt', 'is', null)
    .select('id')
    .executeTakeFirst();
  if (!buyer) throw new Refusal('invalid', 'That buyer was not found', { buyerId: 'Choose a buyer' });
}

async function takeRequest({ db, roomId }: Acting, requestId: string): Promise<void> {
  const done = await db
    .updateTable('request')
    .set((eb) => ({ state: 'ordered' as const, version: eb('version', '+', 1) }))
    .where('roomId', '=', roomId)
    .where('id', '=', requestId)
    .where('state', '!=', 'ordered')
    .executeTakeFirst();
  if (done.numUpdatedRows === 0n)
    throw new Refusal('invalid', 'That request was not found', { requestId: 'Choose an open request' });
}

type Adding = { orderId: string; line: LineDraft; i: number; isGift: boolean };

async function addLine(scope: Acting, { orderId, line, i, isGift }: Adding): Promise<void> {
  const { id, broodId, fishId, lot, heads, note } = line;
  if ((broodId === null) === (fishId === null))
    throw new Refusal('invalid', 'A line is of a brood, or one fish', {
      [`lines.${i}.broodId`]: 'Choose a brood or a fish',
    });
  if (broodId) await mustBeBrood(scope, broodId, `lines.${i}.broodId`);
  if (fishId) await mustLive(scope, { fishId, heads }, `lines.${i}`);
  const cents = isGift || !broodId ? 0 : await listPrice(scope, { broodId, lot, heads });
  await scope.db
    .insertInto('purchaseLine')
    .values({ roomId: scope.roomId, id, purchaseId: orderId, broodId, fishId, lot, heads, cents, note })
    .execute();
}

async function mustBeBrood({ db, roomId }: Acting, broodId: string, field: string): Promise<void> {
  const brood = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('id', '=', broodId)
    .select('id')
    .executeTakeFirst();
  if (!brood) throw new Refusal('invalid', 'That brood was not found', { [field]: 'Choose a brood' });
}

async function mustLive(
  scope: Acting,
  { fishId, heads }: { fishId: string; heads: number },
  field: string,
): Promise<void> {
  const row = await scope.db
    .selectFrom('fish')
    .leftJoin('fishExit', (join) =>
      join.onRef('fishExit.roomId', '=', 'fish.roomId').onRef('fishExit.fishId', '=', 'fish.id'),
    )
    .where('fish.roomId', '=', scope.roomId)
    .where('fish.id', '=', fishId)
    // An ancestor of another fishroom, known from its sheet, has no life here.
    .where('fish.origin', '<>', 'imported')
    .select(['fish.id', 'fishExit.id as exitId'])
    .executeTakeFirst();
  if (!row || row.exitId)
    throw new Refusal('invalid', 'That fish is not here', { [`${field}.fishId`]: 'Choose a fish that is here' });
  if (heads !== 1) throw new Refusal('invalid', 'A fish with a code is one fish', { [`${field}.heads`]: 'One' });
}

/** By what is offered and the size today, by the growth curve; 0 where no price is set, which the owner then gives. */
async function listPrice(
  scope: Acting,
  line: { broodId: string; lot: LineDraft['lot']; heads: number },
): Promise<number> {
  const listing = await scope.db
    .selectFrom('listing')
    .where('roomId', '=', scope.roomId)
    .where('broodId', '=', line.broodId)
    .select(['classes', 'lots'])
    .executeTakeFirst();
  if (!listing) return 0;
  const [brood] = await broodRows(scope, { ids: [line.broodId] });
  const prices = {
    classes: PriceClasses.parse(JSON.parse(listing.classes)),
    lots: PriceLots.parse(JSON.parse(listing.lots)),
  };
  const size = brood ? sizeTodayOf(await growthOfBrood(scope, brood), scope.today) : null;
  return priceOf(prices, { ...line, lengthTenthsMm: size?.meanTenthsMm ?? null }) ?? 0;
}

/** Another number of heads, or the owner's own price. Fewer keep their place; more have to be available. */
export async function changeOneLine(
  scope: Scope,
  { orderId, lineId }: { orderId: string; lineId: string },
  { version, heads, cents }: z.output<typeof changeLine.body>,
) {
  const order = await storedOrder(scope, orderId);
  mustBeSeen(order, version, await oneOrder(scope, EVERYTHING, orderId));
  const line = (await lineRows(scope, [orderId])).find(({ id }) => id === lineId);
  if (!line) throw notFound('That line');
  if (hasLeft(order.state) || order.state === 'cancelled')
    throw new Refusal('conflict', 'The fish of this order have left, or it is cancelled: its lines stay as they are');
  if (line.fishId && heads !== 1) throw new Refusal('invalid', 'A fish with a code is one fish', { heads: 'One' });
  if (line.broodId && isHoldingState(order.state) && heads !== line.heads)
    await claimOther(scope, { ...line, broodId: line.broodId }, heads);
  const priced =
    cents ??
    (line.broodId && order.way !== 'gift' ? await listPrice(scope, { ...line, broodId: line.broodId, heads }) : 0);
  await scope.db
    .updateTable('purchaseLine')
    .set({ heads, cents: priced })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', lineId)
    .execute();
  await changeStored(scope, orderId, {});
  const change = { heads: [line.heads, heads] as [number, number], cents: [line.cents, priced] as [number, number] };
  await audit(scope, { action: 'order line changed', about: 'order', aboutId: orderId, change });
  return oneOrder(scope, EVERYTHING, orderId);
}

async function claimOther(
  scope: Scope,
  line: { id: string; broodId: string; heads: number },
  heads: number,
): Promise<void> {
  if (heads < line.heads) return changeClaim(scope, line.id, heads);
  const { available } = await availableOf(scope, line.broodId);
  if (available < heads - line.heads)
    throw new Refusal('conflict', `Only ${Math.max(0, available)} more are available`, {
      heads: `At most ${line.heads + Math.max(0, available)}`,
    });
  return changeClaim(scope, line.id, heads);
}
