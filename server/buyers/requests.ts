import type * as z from 'zod/mini';
import type { closeRequest, orderRequest, RequestRow } from '../../shared/buyers/requests';
import { dayOf } from '../../shared/days';
import { Refusal } from '../../shared/refusal';
import { broodRows } from '../broods';
import { audit } from '../db/audit';
import { makeOrder } from '../orders';
import type { Scope } from '../scope';
import { aboutOf } from './offers';
import { isOpen, openRequests, placesOf } from './row';
import { oneRequest, type StoredRequest } from './stored';
import { whatOf } from './what';

type Told = z.input<typeof RequestRow>;

/** As many as anyone looks through of those that are over. */
const SHOWN = 100;

/** What visitors ask for: open requests in the order of their rows, then what is over, newest first. */
export async function requestRows(scope: Scope): Promise<Told[]> {
  const { db, roomId, timeZone } = scope;
  const open = await openRequests(scope);
  const places = placesOf(open);
  const over = await db
    .selectFrom('request')
    .where('roomId', '=', roomId)
    .where('state', 'in', ['ordered', 'closed'])
    .select('id')
    .orderBy('id', 'desc')
    .limit(SHOWN)
    .execute();
  const sources = await sourcesIn(scope);
  const day = (at: string) => dayOf(Date.parse(at), timeZone);
  const told: Told[] = [];
  for (const { id } of [...open, ...over]) {
    const request = await oneRequest(scope, id);
    const { name, locality, broodCode, strain } = await whatOf(scope, request);
    const { version, kind, state, heads, lengthTenthsMm, words, broodId, strainId, waitsForFish } = request;
    const standing = places.get(id);
    told.push({
      ...{ id, version, kind, state, name, locality, strain, heads, lengthTenthsMm, words },
      buyer: { id: request.buyerId, name: request.buyerName, email: request.email },
      brood: broodId ? { id: broodId, code: broodCode ?? '' } : null,
      madeOn: day(request.confirmedAt ?? request.createdAt),
      notifiedOn: request.notifiedAt ? day(request.notifiedAt) : null,
      order: await orderOf(scope, id),
      waitsForFish: waitsForFish === 1,
      place: standing?.place ?? null,
      before: standing?.before ?? 0,
      sources: standing
        ? sources.filter((one) => (broodId ? one.broodId === broodId : one.strainId === strainId)).map(withoutStrain)
        : [],
    });
  }
  return told;
}

/** Broods with fish, as a request may be answered from them. */
async function sourcesIn(scope: Scope) {
  const found = [];
  for (const row of await broodRows(scope, { hereOnly: true })) {
    const { broodId, code, strainId, available, size } = await aboutOf(scope, row);
    found.push({ broodId, code, strainId, available, size });
  }
  return found;
}

const withoutStrain = ({ strainId: _strain, ...source }: Awaited<ReturnType<typeof sourcesIn>>[number]) => source;

async function orderOf({ db, roomId }: Scope, requestId: string) {
  const order = await db
    .selectFrom('purchase')
    .where('roomId', '=', roomId)
    .where('requestId', '=', requestId)
    .select(['id', 'number'])
    .executeTakeFirst();
  return order ?? null;
}

/** A request becomes an order, in its turn or knowingly out of it. */
export async function orderOfRequest(scope: Scope, requestId: string, draft: z.output<typeof orderRequest.body>) {
  const request = await oneRequest(scope, requestId);
  mustBeOpen(request, draft.version);
  const { place = 1 } = placesOf(await openRequests(scope)).get(requestId) ?? {};
  if (place > 1 && !draft.outOfTurn)
    throw new Refusal('conflict', `${place - 1} asked for the same before`, {
      outOfTurn: 'Say that it goes out of turn, or answer those before first',
    });
  const { orderId, lineId, broodId, heads, lot, reserve } = draft;
  const order = await makeOrder(scope, {
    id: orderId,
    buyerId: request.buyerId,
    requestId,
    way: 'sale',
    lines: [{ id: lineId, broodId, fishId: null, lot, heads, note: null }],
    note: request.words,
    reserve,
  });
  return { orderId: order.id, number: order.number };
}

export async function endRequest(scope: Scope, requestId: string, { version }: z.output<typeof closeRequest.body>) {
  mustBeOpen(await oneRequest(scope, requestId), version);
  await scope.db
    .updateTable('request')
    .set({ state: 'closed', version: version + 1 })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', requestId)
    .execute();
  await audit(scope, { action: 'request closed', about: 'request', aboutId: requestId });
}

function mustBeOpen({ state, version }: StoredRequest, seen: number): void {
  if (!isOpen.some((one) => one === state)) throw new Refusal('conflict', 'This request is over already');
  if (version !== seen) throw new Refusal('conflict', 'This request was changed meanwhile: look at it again');
}
