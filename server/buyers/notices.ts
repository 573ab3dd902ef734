import { addDays } from '../../shared/days';
import { broodRows } from '../broods';
import { touchRooms } from '../db/touchRooms';
import type { House } from '../house';
import { roomAsked, termsOf } from '../orders';
import type { Asked, RoomAsked } from '../scope';
import { aboutOf, listingsOf } from './offers';
import { forgetUnconfirmed } from './pending';
import { writeNotice } from './requestLetters';
import { openRequests, placesOf } from './row';
import { oneRequest } from './stored';

const EVERY_MS = 10 * 60_000;

type Open = Awaited<ReturnType<typeof openRequests>>[number];

/** Tells those who wait of fish that came free or have reached their size, once each. Answers how many were told. */
export async function tellThoseWhoWait(house: House): Promise<number> {
  const now = house.clock.now().toISOString();
  const asked = { db: house.db, house, now, requestId: 'notices', log: house.log, address: '', device: '' };
  await forgetUnconfirmed(asked);
  // Of every fishroom: the worker has none of its own.
  const rooms = await house.db
    .selectFrom('request')
    .where('state', '=', 'waiting')
    .select('roomId')
    .distinct()
    .execute();
  let told = 0;
  for (const { roomId } of rooms) told += await tellIn(asked, roomId);
  return told;
}

function tellIn(asked: Asked, roomId: string): Promise<number> {
  return asked.db.transaction().execute(async (db) => {
    const scope = await roomAsked({ ...asked, db }, roomId);
    const open = await openRequests(scope);
    const places = placesOf(open);
    let told = 0;
    for (const request of open) {
      if (request.state !== 'waiting') continue;
      const free = request.waitsForFish === 1 && places.get(request.id)?.fits === true;
      const grown = request.kind === 'notice' ? await grownFor(scope, request) : 0;
      if (!free && grown === 0) continue;
      if (await tell(scope, request, free ? request.available : grown)) told += 1;
    }
    if (told > 0) await touchRooms(db, [roomId]);
    return told;
  });
}

/** How many of the strain are for sale out of broods of which half or more have reached the length; none: not yet. */
async function grownFor(scope: RoomAsked, { strainId, lengthTenthsMm, heads }: Open): Promise<number> {
  const listed = [...(await listingsOf(scope))].flatMap(([id, listing]) => (listing.listed ? [id] : []));
  let grown = 0;
  for (const row of await broodRows(scope, { ids: listed })) {
    if (row.strainId !== strainId) continue;
    const { size, available } = await aboutOf(scope, row);
    if (size && size.meanTenthsMm >= (lengthTenthsMm ?? 0)) grown += available;
  }
  return grown >= (heads ?? 1) ? grown : 0;
}

/** False where there is nobody to write to, or who does not want letters. */
async function tell(scope: RoomAsked, { id, kind }: Open, available: number): Promise<boolean> {
  const { email, ...request } = await oneRequest(scope, id);
  if (!email || request.noticesStoppedAt) return false;
  const { holdDays } = await termsOf(scope);
  const facts = { available, keptUntil: addDays(scope.today, holdDays) };
  await writeNotice(scope, { ...request, email }, kind === 'fish' ? 'fishFree' : 'sizeReached', facts);
  await scope.db
    .updateTable('request')
    .set((eb) => ({ state: 'notified' as const, notifiedAt: scope.now, version: eb('version', '+', 1) }))
    .where('roomId', '=', scope.roomId)
    .where('id', '=', id)
    .execute();
  return true;
}

/** Looks every ten minutes, never twice at once. */
export function startNotices(house: House): { stop(): Promise<void> } {
  let running: Promise<unknown> = Promise.resolve();
  const look = () => {
    running = running
      .then(() => tellThoseWhoWait(house))
      .catch((error: unknown) => house.log.error({ err: error, event: 'notices' }, 'notices stopped short'));
  };
  const timer = setInterval(look, EVERY_MS);
  look();
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
