import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { MEASURES, METHODS } from './entries';

export const Sample = z.strictObject({
  id: Id,
  of: z.strictObject({ thing: z.enum(['brood', 'batch', 'fish']), id: Id, code: z.nullable(z.string()) }),
  onDay: DayText,
  measure: z.enum(MEASURES),
  method: z.enum(METHODS),
  readings: z.array(z.strictObject({ lengthTenthsMm: z.number(), weightG: z.nullable(z.number()) })),
  note: z.nullable(z.string()),
  by: z.string(),
  entryId: z.nullable(Id),
  /** Taken from a batch in which other broods swam too: it says less about this one. */
  mixed: z.boolean(),
});
export type Sample = z.output<typeof Sample>;

/** Samples of a brood (its own and those of its batches), of a batch, or of a fish; oldest first. */
export const listSamples = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/samples',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ thing: z.enum(['brood', 'batch', 'fish']), thingId: Id }),
  output: z.strictObject({
    samples: z.array(Sample),
    /** What age counts from: the middle of the spawn interval; null for a fish that came from outside. */
    spawnEarliest: z.nullable(DayText),
    spawnLatest: z.nullable(DayText),
    speciesId: z.nullable(z.string()),
    overrides: z.record(z.string(), z.unknown()),
  }),
});

/** Samples of a strain's latest forty broods, oldest first, for comparison. */
export const listStrainSamples = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/strains/:strainId/samples',
  needs: 'stock:see',
  params: inRoom({ strainId: Id }),
  output: z.strictObject({
    broods: z.array(
      z.strictObject({
        id: Id,
        code: z.string(),
        spawnEarliest: DayText,
        spawnLatest: DayText,
        samples: z.array(Sample),
      }),
    ),
  }),
});
