import type * as z from 'zod/mini';
import type { AvailableFish, AvailablePage } from '../../shared/buyers/available';
import { dayOf } from '../../shared/days';
import { targetOf } from '../../shared/growth/target';
import { priceOf } from '../../shared/orders/price';
import { termsText } from '../../shared/orders/terms';
import { notFound } from '../../shared/refusal';
import { broodRows } from '../broods';
import { growthOfBrood } from '../growth';
import { termsOf } from '../orders';
import type { Asked, RoomAsked } from '../scope';
import { lineageTold } from '../sheets';
import { aboutOf, listingsOf } from './offers';
import { pageOf } from './page';

type Page = z.input<typeof AvailablePage>;
type Fish = z.input<typeof AvailableFish>;
type PublicRoom = { scope: RoomAsked; name: string; slug: string; place: string | null; changeNumber: number };

/** A fishroom by the word in its public address; there is no page before something was listed. */
export async function publicRoom(asked: Asked, slug: string): Promise<PublicRoom> {
  const room = await asked.db
    .selectFrom('room')
    .where('slug', '=', slug)
    .where(({ exists, selectFrom }) =>
      exists(selectFrom('listing').whereRef('listing.roomId', '=', 'room.id').where('listed', '=', 1).select('id')),
    )
    .select(['id', 'name', 'slug', 'place', 'timeZone', 'currency', 'changeNumber'])
    .executeTakeFirst();
  if (!room) throw notFound('That page');
  const { id: roomId, timeZone, currency, ...facts } = room;
  const today = dayOf(Date.parse(asked.now), timeZone);
  return { scope: { ...asked, roomId, timeZone, currency, today }, ...facts };
}

/** Composed once for each state of a fishroom and day: pedigrees and curves are too dear for every visitor. */
const composed = new Map<string, { key: string; page: Page }>();
const KEPT_ROOMS = 200;

export async function availablePage(asked: Asked, slug: string): Promise<Page> {
  const room = await publicRoom(asked, slug);
  const { roomId, today } = room.scope;
  const key = `${room.changeNumber} ${today}`;
  const known = composed.get(roomId);
  if (known?.key === key) return known.page;
  const page = await compose(room);
  if (composed.size >= KEPT_ROOMS) composed.clear();
  composed.set(roomId, { key, page });
  return page;
}

async function compose({ scope, name, slug, place }: PublicRoom): Promise<Page> {
  const listings = [...(await listingsOf(scope))].filter(([, { listed }]) => listed);
  const rows = await broodRows(scope, { ids: listings.map(([id]) => id) });
  const own = await pageOf(scope);
  const fish: Fish[] = [];
  for (const row of rows) fish.push(await fishOf(scope, row));
  const shown = fish.filter(({ available, coming }) => available > 0 || coming);
  const strains = new Map(
    fish.flatMap(({ strainId, name: species, locality }) =>
      strainId ? [[strainId, { id: strainId, name: species, locality }] as const] : [],
    ),
  );
  return {
    slug,
    name,
    place,
    currency: scope.currency,
    today: scope.today,
    words: own.words,
    contact: own.contact,
    terms: termsText(await termsOf(scope)),
    photo: await coverOf(scope, own.photoId ?? shown.find(({ photoId }) => photoId)?.photoId ?? null),
    fish: shown.sort((a, b) => Number(a.coming !== null) - Number(b.coming !== null) || a.name.localeCompare(b.name)),
    strains: [...strains.values()],
  };
}

type Row = Awaited<ReturnType<typeof broodRows>>[number];

async function fishOf(scope: RoomAsked, row: Row): Promise<Fish> {
  const listing = (await listingsOf(scope)).get(row.id);
  const { size, displayName, ...about } = await aboutOf(scope, row);
  const prices = listing?.prices ?? { classes: [], lots: [] };
  const lengthTenthsMm = size?.meanTenthsMm ?? null;
  return {
    ...about,
    name: displayName ?? 'Species not settled',
    lengthTenthsMm,
    measuredOn: size?.measuredOn ?? null,
    eachCents: priceOf(prices, { lot: 'single', heads: 1, lengthTenthsMm }),
    ...prices,
    note: listing?.note ?? null,
    photoId: listing?.photoId ?? (await latestPhoto(scope, row.id)),
    coming: await comingOf(scope, row, prices.classes[0]?.fromTenthsMm ?? null),
    lineage: await lineageTold(scope, row.id),
  };
}

/** Fish that are still below their first length class are coming. */
async function comingOf(scope: RoomAsked, row: Row, fromTenthsMm: number | null): Promise<Fish['coming']> {
  const grown = await growthOfBrood(scope, row);
  const size = (await aboutOf(scope, row)).size;
  if (fromTenthsMm === null || size === null || size.meanTenthsMm >= fromTenthsMm) return null;
  const on = grown.kind === 'curve' ? (targetOf(grown, fromTenthsMm / 10).half?.on ?? null) : null;
  return { lengthTenthsMm: fromTenthsMm, on: on && on > scope.today ? on : null };
}

async function latestPhoto({ db, roomId }: RoomAsked, broodId: string): Promise<string | null> {
  const photo = await db
    .selectFrom('photo')
    .where('roomId', '=', roomId)
    .where('broodId', '=', broodId)
    .select('id')
    .orderBy('takenOn', 'desc')
    .orderBy('id', 'desc')
    .executeTakeFirst();
  return photo?.id ?? null;
}

async function coverOf({ db, roomId }: RoomAsked, photoId: string | null): Promise<Page['photo']> {
  if (!photoId) return null;
  const photo = await db
    .selectFrom('photo')
    .where('roomId', '=', roomId)
    .where('id', '=', photoId)
    .select(['id', 'takenOn', 'caption'])
    .executeTakeFirst();
  return photo ?? null;
}

/** The picture itself, if it stands on the page. */
export async function photoOnPage(
  asked: Asked,
  slug: string,
  photoId: string,
): Promise<{ roomId: string; name: string }> {
  const page = await availablePage(asked, slug);
  const on = page.photo?.id === photoId || page.fish.some((fish) => fish.photoId === photoId);
  if (!on) throw notFound('That photo');
  return { roomId: (await publicRoom(asked, slug)).scope.roomId, name: page.name };
}
