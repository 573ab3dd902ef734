import * as z from 'zod/mini';
import { FishCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line, Note, queryNumber, Version } from '../shapes';

export const SEXES = ['male', 'female', 'unknown'] as const;
export type Sex = (typeof SEXES)[number];
export const EXITS = ['died', 'sold', 'given', 'traded', 'auctioned', 'lost', 'merged'] as const;
export const EXIT_WORDS = {
  died: 'Died',
  sold: 'Sold',
  given: 'Given away',
  traded: 'Traded',
  auctioned: 'Auctioned',
  lost: 'Lost',
  merged: 'Same fish as another',
};
export const KEPT_AS = ['breeder', 'holdback', 'other'] as const;

const Place = z.nullable(z.strictObject({ id: Id, code: z.string() }));

export const FishRow = z.strictObject({
  id: Id,
  version: Version,
  code: z.nullable(FishCode),
  strainId: z.nullable(Id),
  strainCode: z.nullable(z.string()),
  speciesId: z.nullable(z.string()),
  displayName: z.nullable(z.string()),
  sex: z.enum(SEXES),
  sexCertain: z.boolean(),
  /** Recorded as the dominant male, and no other of the tank since. */
  dominant: z.boolean(),
  mark: z.nullable(z.string()),
  keptAs: z.enum(KEPT_AS),
  origin: z.enum(['founder', 'bred', 'imported']),
  bornOn: z.nullable(DayText),
  arrivedOn: z.nullable(DayText),
  brood: Place,
  colony: Place,
  tank: Place,
  exit: z.nullable(z.strictObject({ kind: z.enum(EXITS), onDay: DayText, cause: z.nullable(z.string()) })),
  /** Last measured, in tenths of a millimetre. */
  lastLengthTenthsMm: z.nullable(z.number()),
});
export type FishRow = z.output<typeof FishRow>;

/** Every fish of the room that has a life here, the dead and sold too; the screen filters. Anonymous fish come without a code. */
export const listFish = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/fish',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ which: z.optional(z.enum(['living', 'all'])) }),
  output: z.strictObject({ fish: z.array(FishRow) }),
});

const Finding = z.strictObject({
  id: Id,
  kind: z.enum(['sex', 'dominance', 'mark', 'check', 'condition']),
  onDay: DayText,
  value: z.string(),
  how: z.nullable(z.enum(['seen', 'vented', 'dna', 'told'])),
  certain: z.boolean(),
  note: z.nullable(z.string()),
  by: z.string(),
});
export type Finding = z.output<typeof Finding>;

export const readFish = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/fish/:fishId',
  needs: 'stock:see',
  params: inRoom({ fishId: Id }),
  output: z.strictObject({
    fish: FishRow,
    note: z.nullable(z.string()),
    lot: z.nullable(
      z.strictObject({ id: Id, fromWhom: z.nullable(z.string()), receivedOn: DayText, provenance: z.string() }),
    ),
    findings: z.array(Finding),
    colonies: z.array(z.strictObject({ id: Id, code: z.string(), fromDay: DayText, untilDay: z.nullable(DayText) })),
    tanks: z.array(z.strictObject({ id: Id, code: z.string(), fromDay: DayText, untilDay: z.nullable(DayText) })),
  }),
});

/** Founders and other fish that came from outside: several at once, coded or anonymous. */
export const addFish = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/fish',
  needs: 'stock:write',
  params: inRoom({}),
  body: z.strictObject({
    /** One id a fish, made on the device. */
    ids: z.array(Id).check(z.minLength(1, 'At least one fish'), z.maxLength(200, 'At most 200 fish at once')),
    codes: z.array(z.nullable(FishCode)),
    strainId: Id,
    sex: z.enum(SEXES, 'Choose a sex'),
    keptAs: z.enum(KEPT_AS, 'Choose what it is kept for'),
    bornOn: z.nullable(DayText),
    arrivedOn: z.nullable(DayText),
    lotId: z.nullable(Id),
    colonyId: z.nullable(Id),
    tankId: z.nullable(Id),
    mark: z.nullable(line(120, 'Type the mark, or leave it empty')),
    note: Note,
  }),
  output: z.strictObject({ fish: z.array(FishRow) }),
});

export const changeFish = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/fish/:fishId',
  needs: 'stock:write',
  params: inRoom({ fishId: Id }),
  body: z.strictObject({
    version: Version,
    code: z.nullable(FishCode),
    keptAs: z.enum(KEPT_AS, 'Choose what it is kept for'),
    bornOn: z.nullable(DayText),
    arrivedOn: z.nullable(DayText),
    note: Note,
  }),
  output: FishRow,
});

/** Codes that are free, for the forms that propose them. */
export const proposeFishCodes = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/fish-codes',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({
    stem: z.string('Send a stem').check(z.maxLength(24, 'Too long')),
    count: z.optional(queryNumber(200)),
  }),
  output: z.strictObject({ codes: z.array(z.string()) }),
});
