import { addDays, type Day, daysBetween, daysFrom } from '../days';
import { type BroodStage, type Clock, isWithin, stageOn } from './clock';

/** One day of a hold or of guarded young, as it is drawn. */
export type DayBar = {
  /** Day 1 is the day of the spawn. */
  day: number;
  on: Day;
  when: 'past' | 'today' | 'ahead';
  stage: BroodStage;
  /** Before she was first seen holding: drawn dashed. */
  unseen: boolean;
  strip: boolean;
  handOver: boolean;
  release: boolean;
  /** The one day release (for guards, swimming free) is expected. */
  expected: boolean;
  checked: boolean;
};

/** Bars past the expected end, and the most that are ever drawn: a forgotten hold does not grow for ever. */
const BARS_AFTER = 1;
const MOST_BARS = 150;

type Marks = { checks?: readonly Day[]; endedOn?: Day | null; plan?: 'strip' | 'leave' };

/**
 * A bar for each day from the spawn to a day past the release window, to today if she is overdue, or to the day it ended.
 * `checks` are days on which someone looked; a hold that is left to release has no strip window. The array is what the day-bars picture draws, from left to right.
 */
export function dayBars(clock: Clock, marks: Marks = {}): DayBar[] {
  const { startedOn, today, releaseLatest } = clock;
  const ended = marks.endedOn ?? null;
  const planned = addDays(releaseLatest, BARS_AFTER);
  const last = ended ?? [planned, today].sort().at(-1) ?? planned;
  const checks = new Set(marks.checks);
  return daysFrom(startedOn, last)
    .slice(0, MOST_BARS)
    .map((on, i) => ({
      day: i + 1,
      on,
      when: whenOf(on, ended === null ? today : null),
      stage: stageOn(clock, on),
      unseen: on < clock.spawnLatest,
      strip: marks.plan !== 'leave' && isWithin(on, clock.stripFrom, clock.stripTo),
      handOver: isWithin(on, clock.handOverFrom, clock.handOverTo),
      release: isWithin(on, clock.releaseEarliest, releaseLatest),
      expected: on === clock.releaseOn,
      checked: checks.has(on),
    }));
}

/** A hold that has ended has no today: its bars are all past. */
function whenOf(on: Day, today: Day | null): DayBar['when'] {
  if (today === null || on < today) return 'past';
  return on === today ? 'today' : 'ahead';
}

/** Number of a date within the clock, day 1 being the spawn; for captions such as "strip 21-28". */
export const dayNumber = (clock: Clock, on: Day): number => daysBetween(clock.startedOn, on) + 1;
