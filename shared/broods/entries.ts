import * as z from 'zod/mini';
import { BroodCode, FishCode } from '../codes';
import { DayText } from '../days';
import { KEPT_AS, SEXES } from '../fish/contract';
import { StageNumbers } from '../holds/entries';
import { Id } from '../ids';
import { ParentageDraft } from '../lineage/parentageDraft';
import { Heads, HeadsOrNone, Note } from '../shapes';
import { LOSS_CAUSES } from './headEntry';

const Cause = z.enum(LOSS_CAUSES, 'Choose a cause');

/** Eggs, wrigglers, free-swimming, dead, deformed: before the head count opens, or the split after a strip's one total. */
const StageCount = z.strictObject({
  kind: z.literal('stageCount'),
  broodId: Id,
  onDay: DayText,
  numbers: StageNumbers,
  note: Note,
});

/** The fry swim free: the head count opens, and survival with it. */
const HeadsOpened = z.strictObject({
  kind: z.literal('headsOpened'),
  batchId: Id,
  onDay: DayText,
  heads: Heads,
  note: Note,
});

/** The heads seen; the difference to the balance is a correction, worked out when read, not a loss. */
const HeadCounted = z.strictObject({
  kind: z.literal('headCounted'),
  batchId: Id,
  onDay: DayText,
  heads: HeadsOrNone,
  note: Note,
});

const HeadsLost = z.strictObject({
  kind: z.literal('headsLost'),
  batchId: Id,
  onDay: DayText,
  heads: Heads,
  cause: Cause,
  note: Note,
});

const HeadsCulled = z.strictObject({
  kind: z.literal('headsCulled'),
  batchId: Id,
  onDay: DayText,
  heads: Heads,
  note: Note,
});

/** Part of a batch goes to another tank as a batch of its own. */
const BatchSplit = z.strictObject({
  kind: z.literal('batchSplit'),
  batchId: Id,
  newBatchId: Id,
  toTankId: Id,
  onDay: DayText,
  heads: Heads,
  note: Note,
});

/** Heads of one batch join another: from then on it is a mixed batch, its sources weighted by heads. */
const BatchJoined = z.strictObject({
  kind: z.literal('batchJoined'),
  batchId: Id,
  intoBatchId: Id,
  onDay: DayText,
  heads: Heads,
  note: Note,
});

/** Fish taken out of a batch to be kept: each is a fish of its own from now on, its parents known through the brood. */
const HeldBack = z.strictObject({
  kind: z.literal('heldBack'),
  batchId: Id,
  onDay: DayText,
  fish: z
    .array(z.strictObject({ id: Id, code: z.nullable(FishCode), sex: z.enum(SEXES, 'Choose a sex') }))
    .check(z.minLength(1, 'At least one fish'), z.maxLength(200, 'At most 200 fish at once')),
  keptAs: z.enum(KEPT_AS, 'Choose what they are kept for'),
  tankId: z.nullable(Id),
  colonyId: z.nullable(Id),
  note: Note,
});

/** Heads that left otherwise than by an order. */
const HeadsLeft = z.strictObject({
  kind: z.literal('headsLeft'),
  batchId: Id,
  onDay: DayText,
  how: z.enum(['sold', 'given', 'traded', 'auctioned'], 'Choose how they left'),
  heads: Heads,
  note: Note,
});

/** A later correction: the line stays, a reversing line is added. */
const HeadLineReversed = z.strictObject({
  kind: z.literal('headLineReversed'),
  batchId: Id,
  lineId: Id,
  onDay: DayText,
  note: Note,
});

/** A brood without a recorded hold: fry found, guarded by their parents, or acquired. */
const BroodFound = z.strictObject({
  kind: z.literal('broodFound'),
  broodId: Id,
  batchId: Id,
  code: BroodCode,
  /** Null: no strain is claimed (a possible hybrid). */
  strainId: z.nullable(Id),
  start: z.enum(['found', 'guarded', 'acquired'], 'Choose how they came'),
  onDay: DayText,
  spawnEarliest: DayText,
  spawnLatest: DayText,
  parentage: ParentageDraft,
  tankId: Id,
  numbers: StageNumbers,
  opening: z.nullable(HeadsOrNone),
  note: Note,
});

/** Fish meant to stay but not yet told apart: they are not available to buyers. */
const HeadsKept = z.strictObject({
  kind: z.literal('headsKept'),
  reservationId: Id,
  broodId: Id,
  batchId: z.nullable(Id),
  onDay: DayText,
  heads: Heads,
  note: Note,
});

export const broodEntries = [
  StageCount,
  HeadsOpened,
  HeadCounted,
  HeadsLost,
  HeadsCulled,
  BatchSplit,
  BatchJoined,
  HeldBack,
  HeadsLeft,
  HeadLineReversed,
  BroodFound,
  HeadsKept,
] as const;
