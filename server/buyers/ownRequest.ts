import type * as z from 'zod/mini';
import { foldedEmail } from '../../shared/accounts/shapes';
import type { AskDraft, OwnRequest } from '../../shared/buyers/ask';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { inTransaction } from '../http/serve';
import { hashOfToken, spendMailToken } from '../mail/tokens';
import { roomAsked } from '../orders';
import type { Asked, RoomAsked } from '../scope';
import { pendingBy } from './pending';
import { isOpen, openRequests, placesOf } from './row';
import { whatOf } from './what';

type Told = z.input<typeof OwnRequest>;

/** By the link of a letter, before and after the address is confirmed. Without a fishroom, since the link names one row of all. */
export async function ownRequest(asked: Asked, token: string): Promise<Told> {
  const found = await requestBy(asked, token);
  if (found) return toldOf(await roomAsked(asked, found.roomId), found.id);
  const pending = await pendingBy(asked, token);
  if (!pending) throw notFound('That request');
  const scope = await roomAsked(asked, pending.roomId);
  const { asks } = pending.draft;
  const { broodId, strainId } = { broodId: null, strainId: null, ...asks };
  const { name, broodCode } = await whatOf(scope, { broodId, strainId });
  return {
    room: await roomNamed(scope),
    today: scope.today,
    state: 'unconfirmed',
    kind: asks.kind,
    name,
    broodCode,
    heads: asks.heads,
    lengthTenthsMm: asks.lengthTenthsMm,
    waitsForFish: false,
    place: null,
    noticesStopped: false,
  };
}

async function requestBy({ db }: Asked, token: string) {
  return db
    .selectFrom('request')
    .where('tokenHash', '=', hashOfToken(token))
    .select(['roomId', 'id'])
    .executeTakeFirst();
}

async function toldOf(scope: RoomAsked, id: string): Promise<Told> {
  const request = await scope.db
    .selectFrom('request')
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'request.roomId').onRef('buyer.id', '=', 'request.buyerId'),
    )
    .where('request.roomId', '=', scope.roomId)
    .where('request.id', '=', id)
    .selectAll('request')
    .select('buyer.noticesStoppedAt')
    .executeTakeFirstOrThrow();
  const { name, broodCode } = await whatOf(scope, request);
  return {
    room: await roomNamed(scope),
    today: scope.today,
    state: request.state,
    kind: request.kind,
    name,
    broodCode,
    heads: request.heads,
    lengthTenthsMm: request.lengthTenthsMm,
    waitsForFish: request.waitsForFish === 1,
    place: placesOf(await openRequests(scope)).get(id)?.place ?? null,
    noticesStopped: request.noticesStoppedAt !== null,
  };
}

const roomNamed = ({ db, roomId }: RoomAsked) =>
  db.selectFrom('room').where('id', '=', roomId).select(['name', 'slug']).executeTakeFirstOrThrow();

/** From here on the request stands in the fishroom's row, under the link that it came by. */
export async function confirm(asked: Asked, token: string): Promise<Told> {
  if (await requestBy(asked, token)) return ownRequest(asked, token);
  const pending = await pendingBy(asked, token);
  if (!pending) throw notFound('That request');
  return inTransaction(await roomAsked(asked, pending.roomId), async (scope) => {
    const { id, tokenHash } = await spendMailToken(scope, ['buyer'], token);
    const { asks, words } = pending.draft;
    const { broodId, strainId } = { broodId: null, strainId: null, ...asks };
    const buyerId = await buyerOf(scope, pending.draft);
    await scope.db
      .insertInto('request')
      .values({
        roomId: scope.roomId,
        id,
        buyerId,
        kind: asks.kind,
        broodId,
        strainId,
        heads: asks.heads,
        lengthTenthsMm: asks.lengthTenthsMm,
        words,
        state: 'waiting',
        createdAt: scope.now,
        confirmedAt: scope.now,
        notifiedAt: null,
        tokenHash,
      })
      .execute();
    await waitIfShort(scope, id);
    await audit(scope, { action: 'request made', about: 'request', aboutId: id });
    return toldOf(scope, id);
  });
}

/** The buyer with this address, or a new one. A name that the fishroom knows is not written over by a stranger's. */
async function buyerOf(scope: RoomAsked, { name, email }: AskDraft): Promise<string> {
  const { db, roomId, now } = scope;
  const known = await db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where((eb) => eb(eb.fn<string>('lower', ['email']), '=', foldedEmail(email)))
    .select('id')
    .executeTakeFirst();
  if (known) {
    // Whoever asks anew wants to hear again.
    await db
      .updateTable('buyer')
      .set((eb) => ({ emailConfirmedAt: eb.fn.coalesce('emailConfirmedAt', eb.val(now)), noticesStoppedAt: null }))
      .where('roomId', '=', roomId)
      .where('id', '=', known.id)
      .execute();
    return known.id;
  }
  const id = newId(now);
  const nothing = { accountId: null, phone: null, address: null, note: null, noticesStoppedAt: null, erasedAt: null };
  await db
    .insertInto('buyer')
    .values({ roomId, id, name, email, ...nothing, emailConfirmedAt: now, createdAt: now })
    .execute();
  return id;
}

/** Fish that are not there, or are asked for by those before, are waited for. */
async function waitIfShort(scope: RoomAsked, id: string): Promise<void> {
  const standing = placesOf(await openRequests(scope)).get(id);
  if (!standing || standing.fits) return;
  await scope.db
    .updateTable('request')
    .set({ waitsForFish: 1 })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', id)
    .where('kind', '=', 'fish')
    .execute();
}

async function mustFind(asked: Asked, token: string) {
  const found = await requestBy(asked, token);
  if (!found) throw notFound('That request');
  return { scope: await roomAsked(asked, found.roomId), id: found.id };
}

export async function withdraw(asked: Asked, token: string): Promise<Told> {
  const { scope: outside, id } = await mustFind(asked, token);
  return inTransaction(outside, async (scope) => {
    const done = await scope.db
      .updateTable('request')
      .set((eb) => ({ state: 'closed' as const, version: eb('version', '+', 1) }))
      .where('roomId', '=', scope.roomId)
      .where('id', '=', id)
      .where('state', 'in', isOpen)
      .executeTakeFirst();
    if (done.numUpdatedRows === 0n) throw new Refusal('conflict', 'This request is over already');
    await audit(scope, { action: 'request withdrawn', about: 'request', aboutId: id });
    return toldOf(scope, id);
  });
}

/** No more notices: those that wait for one are over, and none is begun. */
export async function stop(asked: Asked, token: string): Promise<Told> {
  const { scope: outside, id } = await mustFind(asked, token);
  return inTransaction(outside, async (scope) => {
    const { db, roomId, now } = scope;
    const { buyerId } = await db
      .selectFrom('request')
      .where('roomId', '=', roomId)
      .where('id', '=', id)
      .select('buyerId')
      .executeTakeFirstOrThrow();
    await db
      .updateTable('buyer')
      .set({ noticesStoppedAt: now })
      .where('roomId', '=', roomId)
      .where('id', '=', buyerId)
      .execute();
    await db
      .updateTable('request')
      .set((eb) => ({ state: 'closed' as const, version: eb('version', '+', 1) }))
      .where('roomId', '=', roomId)
      .where('buyerId', '=', buyerId)
      .where('kind', '=', 'notice')
      .where('state', 'in', isOpen)
      .execute();
    await audit(scope, { action: 'notices stopped', about: 'buyer', aboutId: buyerId });
    return toldOf(scope, id);
  });
}
