import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { BREEDING_MODES } from '../species/species';
import { CHECK_SEEN, HOLD_OUTCOMES, HOLD_PLANS } from './entries';

/** A possible parent as screens show it. `share` sums to 1 over its side; `fishId` null is a fish that is not known. */
export const ParentShare = z.strictObject({
  fishId: z.nullable(Id),
  code: z.nullable(z.string()),
  share: z.number(),
});
export type ParentShare = z.output<typeof ParentShare>;

export const ParentageTold = z.strictObject({
  rootId: Id,
  turn: z.number(),
  paternity: z.enum(['single', 'mixed']),
  sires: z.array(ParentShare),
  dams: z.array(ParentShare),
  basis: z.nullable(z.string()),
});
export type ParentageTold = z.output<typeof ParentageTold>;

const Place = z.strictObject({ id: Id, code: z.string() });

/**
 * What a hold's clock is run on: `careProfileOf`, `learnHoldProfile` and `careClock` of `shared/holds` turn it into days, in
 * the browser as on the server. `finished` are this fishroom's released holds of the species.
 */
export const ClockFacts = z.strictObject({
  speciesId: z.nullable(z.string()),
  /** Figures that this fishroom set for the species. */
  overrides: z.record(z.string(), z.unknown()),
  about: z.nullable(z.record(z.string(), z.unknown())),
  finished: z.array(z.strictObject({ days: z.number(), meanC: z.number() })),
  temperatures: z.array(z.strictObject({ on: DayText, celsius: z.number() })),
});
export type ClockFacts = z.output<typeof ClockFacts>;

export const HoldRow = z.strictObject({
  id: Id,
  version: z.number(),
  holder: z.nullable(z.strictObject({ id: Id, code: z.nullable(z.string()) })),
  colony: z.nullable(Place),
  tank: Place,
  strainId: z.nullable(Id),
  strainCode: z.nullable(z.string()),
  displayName: z.nullable(z.string()),
  locality: z.nullable(z.string()),
  mode: z.nullable(z.enum(BREEDING_MODES)),
  spawnSeen: z.boolean(),
  spawnEarliest: DayText,
  spawnLatest: DayText,
  firstSeenOn: DayText,
  plan: z.enum(HOLD_PLANS),
  outcome: z.nullable(z.enum(HOLD_OUTCOMES)),
  endedOn: z.nullable(DayText),
  /** Days on which someone looked. */
  checkedOn: z.array(DayText),
  brood: z.nullable(Place),
  /** Females in the colony, for "1 of 9, unmarked". */
  femalesInColony: z.number(),
  clock: ClockFacts,
});
export type HoldRow = z.output<typeof HoldRow>;

/** What a conflict answers: the record that is there already, and who wrote it when. Null: it came with an import. */
export const HoldClash = z.strictObject({
  hold: HoldRow,
  sires: z.array(ParentShare),
  entryId: z.nullable(Id),
  by: z.nullable(z.string()),
  madeAt: z.nullable(z.string()),
});
export type HoldClash = z.output<typeof HoldClash>;

export const listHolds = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/holds',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({
    which: z.optional(z.enum(['open', 'all'])),
    colonyId: z.optional(Id),
    holderId: z.optional(Id),
  }),
  output: z.strictObject({ holds: z.array(HoldRow) }),
});

export const readHold = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/holds/:holdId',
  needs: 'stock:see',
  params: inRoom({ holdId: Id }),
  output: z.strictObject({
    hold: HoldRow,
    note: z.nullable(z.string()),
    parentage: ParentageTold,
    /** True when a possible sire is of another strain: the brood makes no strain claim until it is settled. */
    possibleHybrid: z.boolean(),
    checks: z.array(
      z.strictObject({
        id: Id,
        onDay: DayText,
        seen: z.enum(CHECK_SEEN),
        note: z.nullable(z.string()),
        by: z.string(),
      }),
    ),
    /** Her earlier holds, newest first. */
    earlier: z.array(
      z.strictObject({
        id: Id,
        outcome: z.nullable(z.enum(HOLD_OUTCOMES)),
        spawnLatest: DayText,
        endedOn: z.nullable(DayText),
        brood: z.nullable(Place),
        /** Heads with which the brood's count opened, else what was counted at the strip; null when nothing was. */
        fry: z.nullable(z.number()),
      }),
    ),
  }),
});

/** Adult males and unsexed adults that were in the tank while she may have spawned, whatever their strain, with proposed shares. */
export const proposeSires = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/tanks/:tankId/possible-sires',
  needs: 'stock:see',
  params: inRoom({ tankId: Id }),
  query: z.strictObject({ from: DayText, until: DayText }),
  output: z.strictObject({
    sires: z.array(
      z.strictObject({
        fishId: Id,
        code: z.nullable(z.string()),
        sex: z.enum(['male', 'unknown']),
        strainCode: z.nullable(z.string()),
        strainId: z.nullable(Id),
        /** Of another strain or species than most of the tank. */
        foreign: z.boolean(),
        /** Days recorded as dominant within the interval and the fortnight before it. */
        dominantDays: z.number(),
        ofDays: z.number(),
        share: z.number(),
        /** Of a species whose males hold: the hold it has now, and the day that its days count from. */
        openHoldId: z.nullable(Id),
        holdingSince: z.nullable(DayText),
      }),
    ),
    /** What the species profile proposes; null where the habit is not known. */
    paternity: z.nullable(z.enum(['single', 'mixed'])),
    /** The strains of the tank: how each carries its young, and what the clock of a hold that begins now would run on. */
    strains: z.array(
      z.strictObject({
        strainId: Id,
        strainCode: z.string(),
        displayName: z.string(),
        locality: z.nullable(z.string()),
        mode: z.nullable(z.enum(BREEDING_MODES)),
        paternity: z.nullable(z.enum(['single', 'mixed'])),
        clock: ClockFacts,
      }),
    ),
    /** The last day before today on which someone looked into the tank: a hold, a check, "seen well". */
    lookedOn: z.nullable(DayText),
    /** Females of the tank, those that hold already with the day they are on. */
    females: z.array(
      z.strictObject({
        fishId: Id,
        code: z.nullable(z.string()),
        colonyId: z.nullable(Id),
        strainId: z.nullable(Id),
        sex: z.enum(['female', 'unknown']),
        openHoldId: z.nullable(Id),
        holdingSince: z.nullable(DayText),
        /** When her last hold ended: she was not holding then. */
        lastEndedOn: z.nullable(DayText),
      }),
    ),
  }),
});
