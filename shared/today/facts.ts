import * as z from 'zod/mini';
import { BroodRow } from '../broods/contract';
import { DayText } from '../days';
import { HoldRow } from '../holds/contract';
import { Id } from '../ids';
import { Care, WaterReading } from '../water/contract';
import { Intervals } from './intervals';

const Place = z.strictObject({ id: Id, code: z.string() });

/** A species as it is judged: the library's id, and what the fishroom set for it. */
const SpeciesSeen = z.strictObject({
  id: z.string(),
  name: z.string(),
  about: z.nullable(z.record(z.string(), z.unknown())),
  overrides: z.record(z.string(), z.unknown()),
});

export const TankToday = z.strictObject({
  id: Id,
  code: z.string(),
  place: z.nullable(z.string()),
  litres: z.number(),
  /** Since when fish have been in it; null when it is empty. */
  stockedSince: z.nullable(DayText),
  speciesIds: z.array(z.string()),
  /** Latest reading of each kind, whenever it was taken. */
  latest: z.nullable(WaterReading),
  testedOn: z.nullable(DayText),
  changedOn: z.nullable(DayText),
  changedPercent: z.nullable(z.number()),
});
export type TankToday = z.output<typeof TankToday>;

/** An order as Today needs it; names and money are absent for roles that may not see them. */
export const OrderToday = z.strictObject({
  id: Id,
  number: z.number(),
  state: z.string(),
  buyerName: z.nullable(z.string()),
  what: z.string(),
  time: z.nullable(z.string()),
  toPayCents: z.nullable(z.number()),
  reservedUntil: z.nullable(DayText),
  /** Since when somebody waits for an answer: a request, or a message that nobody read; for owners. */
  waitsSince: z.nullable(DayText),
  /** Heads by which it falls short since deaths. */
  short: z.number(),
});

/** A request from the public page that can be answered now; for owners. */
export const RequestToday = z.strictObject({
  id: Id,
  code: z.string(),
  what: z.string(),
  buyerName: z.string(),
  waitsSince: DayText,
});

/** What was decided about a task that is worked out, and the fishroom's own tasks. */
export const TaskRow = z.strictObject({
  id: Id,
  taskKey: z.string(),
  title: z.nullable(z.string()),
  about: z.nullable(z.strictObject({ thing: z.string(), id: Id })),
  dueOn: z.nullable(DayText),
  everyDays: z.nullable(z.number()),
  /** It keeps this weekday, 1 on Monday; null: the days count from when it was done. */
  onWeekday: z.nullable(z.number()),
  assignedTo: z.nullable(z.strictObject({ id: Id, name: z.string() })),
  snoozedUntil: z.nullable(DayText),
  doneAt: z.nullable(z.string()),
  /** Who did or skipped it. */
  doneBy: z.nullable(z.string()),
  skippedBecause: z.nullable(z.string()),
  version: z.number(),
});
export type TaskRow = z.output<typeof TaskRow>;

/** Everything that Today is worked out from. Screens, the daily letter and the calendar feed read the same. */
export const TodayFacts = z.strictObject({
  today: DayText,
  intervals: Intervals,
  holds: z.array(HoldRow),
  broods: z.array(BroodRow),
  /** Batches with eggs or fish, and when each was last counted and measured. */
  batches: z.array(
    z.strictObject({
      id: Id,
      codes: z.array(z.string()),
      broodIds: z.array(Id),
      tank: z.nullable(Place),
      balance: z.number(),
      startedOn: DayText,
      spawnLatest: DayText,
      speciesId: z.nullable(z.string()),
      openedOn: z.nullable(DayText),
      countedOn: z.nullable(DayText),
      stageCountedOn: z.nullable(DayText),
      sampledOn: z.nullable(DayText),
      meanTenthsMm: z.nullable(z.number()),
    }),
  ),
  tanks: z.array(TankToday),
  care: z.array(Care),
  species: z.array(SpeciesSeen),
  orders: z.array(OrderToday),
  requests: z.array(RequestToday),
  tasks: z.array(TaskRow),
  /** Letters that could not be sent; for owners. */
  failedLetters: z.number(),
  females: z.number(),
});
export type TodayFacts = z.output<typeof TodayFacts>;
