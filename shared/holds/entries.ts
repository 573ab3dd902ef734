import * as z from 'zod/mini';
import { BroodCode } from '../codes';
import { DayText } from '../days';
import { Id } from '../ids';
import { ParentageDraft } from '../lineage/parentageDraft';
import { HeadsOrNone, Note } from '../shapes';

export const HOLD_PLANS = ['strip', 'leave'] as const;
export const HOLD_OUTCOMES = ['stripped', 'released', 'swallowed', 'lost', 'diedHolding'] as const;
export type HoldOutcome = (typeof HOLD_OUTCOMES)[number];
export const OUTCOME_WORDS: Record<HoldOutcome, string> = {
  stripped: 'Stripped',
  released: 'Released',
  swallowed: 'Swallowed',
  lost: 'Lost',
  diedHolding: 'Died holding',
};
export const CHECK_SEEN = ['holding', 'notHolding', 'unsure', 'eggs', 'wrigglers', 'freeSwimming', 'eyes'] as const;
export const CHECK_WORDS: Record<(typeof CHECK_SEEN)[number], string> = {
  holding: 'Still holding',
  notHolding: 'Mouth empty',
  unsure: 'Not sure',
  eggs: 'Eggs seen',
  wrigglers: 'Wrigglers seen',
  freeSwimming: 'Free-swimming fry seen',
  eyes: 'Eyes seen in the throat',
};

const Plan = z.enum(HOLD_PLANS, 'Choose to strip or to leave her');

const begins = {
  holdId: Id,
  tankId: Id,
  colonyId: z.nullable(Id),
  /** Null: can't tell which. For species that guard: the mother, if known. */
  holderId: z.nullable(Id),
  parentage: ParentageDraft,
  plan: Plan,
  note: Note,
};

/** The spawn itself was seen: the hold (or the guarding) starts on that day. */
const SpawnSeen = z.strictObject({ kind: z.literal('spawnSeen'), onDay: DayText, ...begins });

/** A full mouth was seen. The spawn lies between the day she was last seen not holding and the day she was first seen holding. */
const HoldingSeen = z.strictObject({
  kind: z.literal('holdingSeen'),
  firstSeenOn: DayText,
  spawnEarliest: DayText,
  spawnLatest: DayText,
  ...begins,
});

const HoldCheck = z.strictObject({
  kind: z.literal('holdCheck'),
  holdId: Id,
  onDay: DayText,
  seen: z.enum(CHECK_SEEN, 'Choose what was seen'),
  note: Note,
});

const HoldPlanned = z.strictObject({ kind: z.literal('holdPlanned'), holdId: Id, onDay: DayText, plan: Plan });

const HoldFacts = z.strictObject({
  holderId: z.nullable(Id),
  spawnSeen: z.boolean('Say yes or no'),
  spawnEarliest: DayText,
  spawnLatest: DayText,
  firstSeenOn: DayText,
});
export type HoldFacts = z.output<typeof HoldFacts>;

/**
 * A hold that goes on is set right: its days, or the female once she can be told. `was` is what the device saw, so that two
 * corrections do not run over each other. `parentage` null: as it is, with the female as the mother.
 */
const HoldCorrected = z.strictObject({
  kind: z.literal('holdCorrected'),
  holdId: Id,
  onDay: DayText,
  was: HoldFacts,
  now: HoldFacts,
  parentage: z.nullable(ParentageDraft),
  note: Note,
});

/** Counts of a strip or release: one total at once, the split when there is time. Null: not counted. */
export const StageNumbers = z.strictObject({
  total: z.nullable(HeadsOrNone),
  eggs: z.nullable(HeadsOrNone),
  wrigglers: z.nullable(HeadsOrNone),
  freeSwimming: z.nullable(HeadsOrNone),
  dead: z.nullable(HeadsOrNone),
  deformed: z.nullable(HeadsOrNone),
});
export type StageNumbers = z.output<typeof StageNumbers>;

/** A strip or a release makes a brood in a tank; swallowed, lost and died holding make none. */
const HoldEnded = z.strictObject({
  kind: z.literal('holdEnded'),
  holdId: Id,
  onDay: DayText,
  outcome: z.enum(HOLD_OUTCOMES, 'Choose how it ended'),
  brood: z.nullable(
    z.strictObject({
      broodId: Id,
      batchId: Id,
      code: BroodCode,
      tankId: Id,
      numbers: StageNumbers,
      /** Opens the head count when the fry already swim free; null while there are eggs or wrigglers. */
      opening: z.nullable(HeadsOrNone),
    }),
  ),
  note: Note,
});

export const holdEntries = [SpawnSeen, HoldingSeen, HoldCheck, HoldPlanned, HoldCorrected, HoldEnded] as const;
