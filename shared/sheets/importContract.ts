import * as z from 'zod/mini';
import { FishCode, StrainCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { KEPT_AS } from '../fish/contract';
import { Id } from '../ids';
import { AnimalId } from './ancestry';
import { SheetContent } from './content';
import { Jws, PublicJwk } from './sheetFile';
import { Address } from './wording';

/** A sheet's check page, here or elsewhere: "https://fish.example/sheet/…". */
export const CheckAddress = Address.check(
  z.regex(/^[^?#]+\/sheet\/[\w-]{22}\/?$/, 'That is not the address of a sheet: it ends in /sheet/ and 22 letters'),
);

/** Where a sheet comes from: its file, or the address that is printed on it. `keys`: pasted, vouched for by a person. */
export const SheetSource = z.discriminatedUnion(
  'from',
  [
    z.strictObject({
      from: z.literal('file'),
      jws: Jws,
      keysAt: z.nullable(Address),
      keys: z.nullable(z.array(PublicJwk).check(z.minLength(1, 'There is no key in it'), z.maxLength(1000))),
    }),
    z.strictObject({ from: z.literal('address'), at: CheckAddress }),
  ],
  'Choose a file, or type the sheet’s address',
);
export type SheetSource = z.output<typeof SheetSource>;

/** How far the signature carries: checked by a key that was published here or elsewhere, or pasted; or no key was found. */
export const Trust = z.strictObject({
  signature: z.enum(['valid', 'keyUnknown']),
  keysFrom: z.nullable(z.enum(['here', 'address', 'pasted'])),
  keyId: z.nullable(z.string()),
  /** Why no key was found. */
  why: z.nullable(z.string()),
});
export type Trust = z.output<typeof Trust>;

/**
 * What becomes of an animal of the sheet. `ours`: a fish of this fishroom; `same`: known by an earlier sheet; `kept`: known, told
 * otherwise here, and what is known goes on standing; `corrected`: known, and this sheet knows better.
 */
export const FATES = ['new', 'ours', 'same', 'kept', 'corrected'] as const;
export type Fate = (typeof FATES)[number];

const Animal = z.strictObject({
  id: AnimalId,
  code: z.string(),
  sex: z.enum(['male', 'female', 'unsexed']),
  room: z.nullable(z.string()),
  origin: z.enum(['wild', 'bred', 'unknown']),
  generation: z.nullable(z.string()),
  fate: z.enum(FATES),
  /** Of a known one, the fish that it is here. */
  fishId: z.nullable(Id),
});

export const ImportPreview = z.strictObject({
  content: SheetContent,
  trust: Trust,
  /** What its fishroom says of it since. */
  recalled: z.nullable(z.strictObject({ state: z.enum(['replaced', 'withdrawn']), on: DayText })),
  animals: z.array(Animal),
  /** How many fish the sheet is for, and how many of them came in by this very sheet before. */
  heads: z.number(),
  taken: z.number(),
  /** Fish of the same brood, or the fish itself, that came by other sheets. */
  before: z.array(z.strictObject({ number: z.string(), heads: z.number(), on: DayText })),
  /** Strains of the fishroom that fit, and what a new one would be; null where its species is not in the library. */
  strains: z.array(Id),
  newStrain: z.nullable(z.strictObject({ code: z.string(), speciesId: z.string(), name: z.string() })),
  /** A code for a single fish. */
  code: z.nullable(z.string()),
  /** Why it cannot be taken in, in words. */
  refused: z.nullable(z.string()),
});
export type ImportPreview = z.output<typeof ImportPreview>;

/** Reads and checks a sheet, and tells what taking it in would do. Nothing is written. */
export const previewImport = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/sheet-imports/preview',
  needs: 'stock:write',
  params: inRoom({}),
  body: z.strictObject({ source: SheetSource }),
  output: ImportPreview,
});

export const ImportDraft = z.strictObject({
  source: SheetSource,
  /** How many of its fish came; none where only the record is brought up to date. */
  heads: z
    .number('Type how many')
    .check(z.int('Whole fish only'), z.minimum(0, 'Zero or more'), z.maximum(500, 'At most 500')),
  /** How many the preview said were taken in by this sheet before: fish are added to them knowingly. */
  taken: z.number('Send how many were taken in').check(z.int(), z.minimum(0)),
  /** Of the fishroom; null for a new one, or for fish that make no strain's claim. */
  strainId: z.nullable(Id),
  newStrain: z.nullable(z.strictObject({ id: Id, code: StrainCode })),
  code: z.nullable(FishCode),
  keptAs: z.enum(KEPT_AS, 'Choose what they are kept for'),
  receivedOn: DayText,
  tankId: z.nullable(Id),
  quarantineUntil: z.nullable(DayText),
  /** Said by the keeper where no key was found. */
  unchecked: z.boolean('Say yes or no'),
});
export type ImportDraft = z.output<typeof ImportDraft>;

export const ImportedRow = z.strictObject({
  id: Id,
  number: z.string(),
  /** The fishroom that issued it, as it calls itself. */
  room: z.string(),
  address: z.string(),
  subject: z.string(),
  issuedOn: DayText,
  takenInOn: DayText,
  by: z.string(),
  signature: z.enum(['valid', 'keyUnknown']),
  keysFrom: z.nullable(z.enum(['here', 'address', 'pasted'])),
  /** The fish that came with it. */
  fish: z.array(z.strictObject({ id: Id, code: z.nullable(z.string()) })),
  ancestors: z.number(),
});
export type ImportedRow = z.output<typeof ImportedRow>;

export const importSheet = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/sheet-imports',
  needs: 'stock:write',
  params: inRoom({}),
  body: ImportDraft,
  output: ImportedRow,
});

/** Sheets that were taken in, newest first; of one fish, the one that tells of it. */
export const listImported = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheet-imports',
  needs: 'sheet:see',
  params: inRoom({}),
  query: z.strictObject({ fishId: z.optional(Id) }),
  output: z.strictObject({ sheets: z.array(ImportedRow) }),
});

export const readImported = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheet-imports/:importId',
  needs: 'sheet:see',
  params: inRoom({ importId: Id }),
  output: z.strictObject({ row: ImportedRow, content: SheetContent, jws: z.string() }),
});
