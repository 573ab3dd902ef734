import * as z from 'zod/mini';
import { BroodCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { ParentageTold } from '../holds/contract';
import { StageNumbers } from '../holds/entries';
import { Id } from '../ids';
import { Note, Version } from '../shapes';
import { HEAD_KINDS, LOSS_CAUSES } from './headEntry';

const Place = z.strictObject({ id: Id, code: z.string() });

export const BROOD_STARTS = ['stripped', 'released', 'found', 'guarded', 'acquired'] as const;
export const BROOD_START_WORDS = {
  stripped: 'Stripped',
  released: 'Released',
  found: 'Found free-swimming',
  guarded: 'Guarded by the parents',
  acquired: 'Acquired',
};

const LastSample = z.strictObject({
  onDay: DayText,
  n: z.number(),
  meanTenthsMm: z.number(),
  measure: z.enum(['total', 'standard']),
});

export const BroodRow = z.strictObject({
  id: Id,
  version: Version,
  code: BroodCode,
  strainId: z.nullable(Id),
  strainCode: z.nullable(z.string()),
  speciesId: z.nullable(z.string()),
  displayName: z.nullable(z.string()),
  locality: z.nullable(z.string()),
  possibleHybrid: z.boolean(),
  hold: z.nullable(Id),
  dam: z.nullable(z.strictObject({ id: Id, code: z.nullable(z.string()) })),
  spawnEarliest: DayText,
  spawnLatest: DayText,
  startedOn: DayText,
  start: z.enum(BROOD_STARTS),
  /** Heads today over all its batches; of a mixed batch its share by the heads that it brought. */
  heads: z.number(),
  /** True when a mixed batch makes the figure a share and not a count. */
  headsAreShare: z.boolean(),
  /** Heads with which the count opened; null before the fry swim free. */
  opened: z.nullable(z.number()),
  openedOn: z.nullable(DayText),
  countedOn: z.nullable(DayText),
  lost: z.number(),
  reserved: z.number(),
  available: z.number(),
  tanks: z.array(Place),
  lastSample: z.nullable(LastSample),
});
export type BroodRow = z.output<typeof BroodRow>;

export const listBroods = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/broods',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ which: z.optional(z.enum(['here', 'all'])) }),
  output: z.strictObject({ broods: z.array(BroodRow) }),
});

/** A line of a batch's ledger as stored; `headCountOf` replays it, on the screen as on the server. */
export const HeadLine = z.strictObject({
  id: Id,
  on: DayText,
  at: z.string(),
  kind: z.enum(HEAD_KINDS),
  heads: z.number(),
  cause: z.nullable(z.enum(LOSS_CAUSES)),
  reverses: z.nullable(Id),
  note: z.nullable(z.string()),
  by: z.string(),
  entryId: z.nullable(Id),
});
export type HeadLine = z.output<typeof HeadLine>;

export const BatchTold = z.strictObject({
  id: Id,
  startedOn: DayText,
  tank: z.nullable(Place),
  /** Which broods swim in it, by the heads that each brought. One, unless it is mixed. */
  sources: z.array(z.strictObject({ broodId: Id, code: z.string(), share: z.number() })),
  balance: z.number(),
  lines: z.array(HeadLine),
});
export type BatchTold = z.output<typeof BatchTold>;

export const readBrood = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/broods/:broodId',
  needs: 'stock:see',
  params: inRoom({ broodId: Id }),
  output: z.strictObject({
    brood: BroodRow,
    note: z.nullable(z.string()),
    parentage: ParentageTold,
    stageCounts: z.array(
      z.strictObject({ id: Id, onDay: DayText, numbers: StageNumbers, note: z.nullable(z.string()), by: z.string() }),
    ),
    batches: z.array(BatchTold),
    reservations: z.array(
      z.strictObject({
        id: Id,
        kind: z.enum(['order', 'keep']),
        heads: z.number(),
        until: z.nullable(z.string()),
        note: z.nullable(z.string()),
      }),
    ),
    holdbacks: z.array(z.strictObject({ id: Id, code: z.nullable(z.string()), onDay: DayText })),
  }),
});

export const readBatch = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/batches/:batchId',
  needs: 'stock:see',
  params: inRoom({ batchId: Id }),
  output: BatchTold,
});

export const changeBrood = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/broods/:broodId',
  needs: 'stock:write',
  params: inRoom({ broodId: Id }),
  body: z.strictObject({
    version: Version,
    code: BroodCode,
    /** Settling a possible hybrid: the strain it is claimed to be, or none. */
    strainId: z.nullable(Id),
    possibleHybrid: z.boolean('Say yes or no'),
    note: Note,
  }),
  output: BroodRow,
});

/** The next free code for a brood of a strain that starts on a day. */
export const proposeBrood = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/brood-code',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ strainId: z.optional(Id), onDay: DayText }),
  output: z.strictObject({ code: BroodCode }),
});
