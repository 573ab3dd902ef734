import * as z from 'zod/mini';
import { STAGES } from '../broods/stage';
import { DayText } from '../days';
import { endpoint } from '../endpoint';
import { Id } from '../ids';
import { OFFERED_LOTS } from './offers';

export const RoomWord = z
  .string('Send the fishroom’s word')
  .check(z.regex(/^[a-z0-9-]{1,60}$/, 'Letters, digits and hyphens'));

const Kin = {
  role: z.enum(['sire', 'dam']),
  /** Who it may be, likeliest first; empty when nobody is known. */
  codes: z.array(z.string()),
  otherwise: z.string(),
  notes: z.array(z.string()),
  sure: z.boolean(),
};

/** Fish as anyone may read of them. */
export const AvailableFish = z.strictObject({
  broodId: Id,
  code: z.string(),
  strainId: z.nullable(Id),
  name: z.string(),
  locality: z.nullable(z.string()),
  possibleHybrid: z.boolean(),
  stage: z.enum(STAGES),
  available: z.number(),
  lengthTenthsMm: z.nullable(z.number()),
  measuredOn: z.nullable(DayText),
  /** Price of one at today's size; null: on request. */
  eachCents: z.nullable(z.number()),
  classes: z.array(z.strictObject({ fromTenthsMm: z.number(), cents: z.number() })),
  lots: z.array(z.strictObject({ lot: z.enum(OFFERED_LOTS), heads: z.number(), cents: z.number() })),
  note: z.nullable(z.string()),
  photoId: z.nullable(Id),
  /** Still below the first length class; `on`: when half of them reach it, where the growth curve says. */
  coming: z.nullable(z.strictObject({ lengthTenthsMm: z.number(), on: z.nullable(DayText) })),
  lineage: z.strictObject({
    generation: z.string(),
    inbreeding: z.string(),
    known: z.string(),
    parents: z.array(z.strictObject({ ...Kin, parents: z.array(z.strictObject(Kin)) })),
    furtherBack: z.number(),
  }),
});
export type AvailableFish = z.output<typeof AvailableFish>;

export const AvailablePage = z.strictObject({
  slug: z.string(),
  name: z.string(),
  place: z.nullable(z.string()),
  currency: z.string(),
  today: DayText,
  words: z.nullable(z.string()),
  contact: z.nullable(z.string()),
  terms: z.string(),
  photo: z.nullable(z.strictObject({ id: Id, takenOn: DayText, caption: z.nullable(z.string()) })),
  fish: z.array(AvailableFish),
  /** Strains of which a visitor may ask to be told. */
  strains: z.array(z.strictObject({ id: Id, name: z.string(), locality: z.nullable(z.string()) })),
});
export type AvailablePage = z.output<typeof AvailablePage>;

/** The public page of a fishroom. There is none before something has been listed. */
export const readAvailable = endpoint({
  method: 'GET',
  path: '/api/available/:slug',
  needs: 'public',
  params: z.strictObject({ slug: RoomWord }),
  output: AvailablePage,
});

/** Pictures that stand on the public page, and no others. */
export const showAvailablePhoto = endpoint({
  method: 'GET',
  path: '/api/available/:slug/photos/:photoId/:size',
  needs: 'public',
  kind: 'file',
  params: z.strictObject({ slug: RoomWord, photoId: Id, size: z.enum(['small', 'large']) }),
  output: z.unknown(),
});
