import type * as z from 'zod/mini';
import { stageOf } from '../../shared/broods/stage';
import { type Listing, type ListingDraft, OFFERED_LOTS, type Offer } from '../../shared/buyers/offers';
import { PriceClasses, PriceLots } from '../../shared/orders/price';
import { notFound, Refusal } from '../../shared/refusal';
import { may } from '../../shared/roles';
import { adultMm } from '../../shared/species/adultSize';
import { broodRows, claimsOf } from '../broods';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { growthOfBrood, sizeTodayOf } from '../growth';
import type { RoomAsked, Scope } from '../scope';
import { profileIn } from '../species';
import { mustBePhoto } from './page';

type BroodTold = Awaited<ReturnType<typeof broodRows>>[number];
type Told = z.input<typeof Offer>;

/** Broods with fish, those for sale first: what of each is available, how long it is today, what is said of it. */
export async function offersOf(scope: Scope, ids?: string[]): Promise<Told[]> {
  const rows = await broodRows(scope, ids ? { ids } : { hereOnly: true });
  const listings = await listingsOf(scope);
  const claims = await claimsOf(scope);
  const seesMoney = may(scope.role, 'money:see');
  const told: Told[] = [];
  for (const row of rows.filter(({ opened, id }) => opened !== null || listings.has(id))) {
    const own = claims.filter(({ broodId }) => broodId === row.id);
    const heldAs = (kind: 'order' | 'keep') =>
      own.filter((claim) => claim.kind === kind).reduce((sum, { heads }) => sum + heads, 0);
    const listing = listings.get(row.id);
    told.push({
      ...(await aboutOf(scope, row)),
      tanks: row.tanks,
      heads: Math.floor(row.heads + 1e-9),
      reserved: heldAs('order'),
      kept: heldAs('keep'),
      listing: listing ? { ...listing, prices: seesMoney ? listing.prices : null } : null,
    });
  }
  return told.sort(
    (a, b) =>
      Number(b.listing?.listed ?? false) - Number(a.listing?.listed ?? false) ||
      (a.displayName ?? '').localeCompare(b.displayName ?? '') ||
      a.code.localeCompare(b.code),
  );
}

/** What the owner and the public page say alike of a brood. */
export async function aboutOf(scope: RoomAsked, row: BroodTold) {
  const grown = await growthOfBrood(scope, row);
  const size = sizeTodayOf(grown, scope.today);
  const profile = row.speciesId ? await profileIn(scope, row.speciesId) : null;
  const { id: broodId, code, strainId, displayName, locality, possibleHybrid, available } = row;
  const stage = stageOf({
    spawnLatest: row.spawnLatest,
    openedOn: row.openedOn,
    meanMm: size && size.meanTenthsMm / 10,
    adultMm: profile && adultMm(profile, null),
    today: scope.today,
  });
  return {
    broodId,
    code,
    strainId,
    displayName,
    locality,
    possibleHybrid,
    available: Math.max(0, available),
    stage,
    size,
  };
}

/** What was said of each brood. */
export async function listingsOf({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>): Promise<Map<string, ListingHere>> {
  const rows = await db
    .selectFrom('listing')
    .where('roomId', '=', roomId)
    .where('broodId', 'is not', null)
    .selectAll()
    .execute();
  return new Map(
    rows.map(({ broodId, version, listed, note, photoId, classes, lots }) => [
      broodId ?? '',
      { version, listed: listed === 1, note, photoId, prices: pricesOf(classes, lots) },
    ]),
  );
}

type ListingHere = Omit<z.input<typeof Listing>, 'prices'> & { prices: NonNullable<z.input<typeof Listing>['prices']> };

function pricesOf(classes: string, lots: string): ListingHere['prices'] {
  return {
    classes: PriceClasses.parse(JSON.parse(classes)),
    lots: PriceLots.parse(JSON.parse(lots)).flatMap(({ lot, heads, cents }) => {
      const offered = OFFERED_LOTS.find((one) => one === lot);
      return offered ? [{ lot: offered, heads: heads ?? HEADS_OF[offered], cents }] : [];
    }),
  };
}

const HEADS_OF = { pair: 2, trio: 3, group: 4 } as const;

/** Writes down what the owner says of a brood; the last word counts, if it was said of what is there now. */
export async function setOffer(scope: Scope, broodId: string, draft: ListingDraft): Promise<Told> {
  const { db, roomId, now } = scope;
  const [row] = await broodRows(scope, { ids: [broodId] });
  if (!row) throw notFound('That brood');
  if (draft.photoId) await mustBePhoto(scope, draft.photoId);
  lotsMustFit(draft);
  const before = (await listingsOf(scope)).get(broodId);
  if ((before?.version ?? null) !== draft.version)
    throw new Refusal(
      'conflict',
      'Someone changed this meanwhile',
      {},
      { current: (await offersOf(scope, [broodId]))[0] },
    );
  const { listed, note, photoId, classes, lots } = draft;
  const said = { listed: yesOrNo(listed), note, photoId, classes: JSON.stringify(classes), lots: JSON.stringify(lots) };
  if (before)
    await db
      .updateTable('listing')
      .set({ ...said, version: before.version + 1 })
      .where('roomId', '=', roomId)
      .where('broodId', '=', broodId)
      .execute();
  else
    await db
      .insertInto('listing')
      .values({ roomId, id: newId(now), broodId, colonyId: null, ...said })
      .execute();
  const change: Record<string, [boolean, boolean]> = { listed: [before?.listed ?? false, listed] };
  await audit(scope, { action: 'listing changed', about: 'brood', aboutId: broodId, change });
  const [offer] = await offersOf(scope, [broodId]);
  if (!offer) throw notFound('That brood');
  return offer;
}

const yesOrNo = (yes: boolean): 0 | 1 => (yes ? 1 : 0);

function lotsMustFit({ lots }: ListingDraft): void {
  for (const [i, { lot, heads }] of lots.entries()) {
    const fits = lot === 'group' ? heads >= HEADS_OF.group : heads === HEADS_OF[lot];
    if (!fits)
      throw new Refusal('invalid', 'A lot has another number of fish', {
        [`lots.${i}.heads`]: lot === 'group' ? 'Four or more' : `A ${lot} is ${HEADS_OF[lot]}`,
      });
  }
}
