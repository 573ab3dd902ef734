import * as z from 'zod/mini';
import { STAGES } from '../broods/stage';
import { endpoint, inRoom } from '../endpoint';
import { SizeToday } from '../growth/sizeToday';
import { Id } from '../ids';
import { MinorUnits } from '../money';
import { Heads, Note, Version } from '../shapes';
import { TenthsMm } from '../units';

const Place = z.strictObject({ id: Id, code: z.string() });

const AboveZero = MinorUnits.check(z.minimum(1, 'Must be above zero'));

export const PriceClass = z.strictObject({ fromTenthsMm: TenthsMm, cents: AboveZero });

export const OFFERED_LOTS = ['pair', 'trio', 'group'] as const;
export const PriceLot = z.strictObject({
  lot: z.enum(OFFERED_LOTS, 'Choose a pair, a trio or a group'),
  heads: Heads,
  cents: AboveZero,
});

const rises = (classes: { fromTenthsMm: number }[]): boolean =>
  classes.every(({ fromTenthsMm }, i) => i === 0 || fromTenthsMm > (classes[i - 1]?.fromTenthsMm ?? 0));
const once = (lots: { lot: string }[]): boolean => new Set(lots.map(({ lot }) => lot)).size === lots.length;

/** What the owner says of a brood on the public page. */
export const ListingDraft = z.strictObject({
  /** Null: nothing was said of it before. */
  version: z.nullable(Version),
  listed: z.boolean('Say yes or no'),
  classes: z
    .array(PriceClass)
    .check(z.maxLength(6, 'Six length classes at most'), z.refine(rises, 'Each class begins above the one before')),
  lots: z.array(PriceLot).check(z.maxLength(3, 'Three lots at most'), z.refine(once, 'Each kind of lot once')),
  note: Note,
  photoId: z.nullable(Id),
});
export type ListingDraft = z.output<typeof ListingDraft>;

export const Listing = z.strictObject({
  version: Version,
  listed: z.boolean(),
  note: z.nullable(z.string()),
  photoId: z.nullable(Id),
  /** Absent for roles that do not see money. */
  prices: z.nullable(
    z.strictObject({
      classes: z.array(z.strictObject({ fromTenthsMm: z.number(), cents: z.number() })),
      lots: z.array(z.strictObject({ lot: z.enum(OFFERED_LOTS), heads: z.number(), cents: z.number() })),
    }),
  ),
});
export type Listing = z.output<typeof Listing>;

/** A brood with fish, and what of it is for sale. */
export const Offer = z.strictObject({
  broodId: Id,
  code: z.string(),
  strainId: z.nullable(Id),
  displayName: z.nullable(z.string()),
  locality: z.nullable(z.string()),
  possibleHybrid: z.boolean(),
  stage: z.enum(STAGES),
  tanks: z.array(Place),
  heads: z.number(),
  /** Held for orders. */
  reserved: z.number(),
  /** Meant to stay. */
  kept: z.number(),
  available: z.number(),
  size: z.nullable(SizeToday),
  listing: z.nullable(Listing),
});
export type Offer = z.output<typeof Offer>;

/** What stands on the public page besides the fish. */
export const PublicPage = z.strictObject({
  /** Under the fishroom's name. */
  words: Note,
  /** How to reach the fishroom without the form. */
  contact: Note,
  photoId: z.nullable(Id),
});
export type PublicPage = z.output<typeof PublicPage>;

export const listOffers = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/availability',
  needs: 'catch:see',
  params: inRoom({}),
  output: z.strictObject({ offers: z.array(Offer), slug: z.string(), page: PublicPage }),
});

export const setListing = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/availability/:broodId',
  needs: 'sale:write',
  params: inRoom({ broodId: Id }),
  body: ListingDraft,
  output: Offer,
});

export const setPublicPage = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/availability-page',
  needs: 'sale:write',
  params: inRoom({}),
  body: PublicPage,
  output: PublicPage,
});
