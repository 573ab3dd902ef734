import { addDays, type Day, daysBetween } from '../days';
import { careClock, careProfileOf } from '../holds/careProfile';
import type { Clock } from '../holds/clock';
import { clockState } from '../holds/clockWords';
import type { HoldRow } from '../holds/contract';
import { learnHoldProfile } from '../holds/learnHoldProfile';
import type { SpeciesProfile } from '../species/profile';
import type { TodayFacts } from './facts';

export type HoldToday = { hold: HoldRow; clock: Clock | null; basedOn: number; checkDue: boolean; nextOn: Day };

/** The holds with their clocks, by their next date. */
export const holdsToday = (facts: TodayFacts, profiles: Map<string, SpeciesProfile>): HoldToday[] =>
  facts.holds.map((hold) => holdToday(hold, facts, profiles)).sort(byNext);

function holdToday(hold: HoldRow, { today, intervals }: TodayFacts, profiles: Map<string, SpeciesProfile>): HoldToday {
  const profile = profiles.get(hold.clock.speciesId ?? '');
  const care = profile ? careProfileOf(profile) : null;
  const learned = care ? learnHoldProfile(care, hold.clock.finished) : null;
  const clock = learned ? careClock(hold, learned, hold.clock.temperatures, today) : null;
  const looked = hold.checkedOn.at(-1) ?? hold.firstSeenOn;
  return {
    hold,
    clock,
    basedOn: learned?.basedOn ?? 0,
    checkDue: daysBetween(looked, today) >= intervals.holdCheck,
    nextOn: nextDate(hold, clock, today),
  };
}

/** The date that decides where a hold stands in the list: the end of what is open now, or the start of what comes next. */
function nextDate(hold: HoldRow, clock: Clock | null, today: Day): Day {
  if (!clock) return addDays(hold.spawnLatest, 400);
  switch (clockState(clock, hold.plan)) {
    case 'strip':
      return clock.stripTo ?? today;
    case 'early':
      return (hold.plan === 'strip' ? clock.stripFrom : clock.handOverFrom) ?? clock.releaseEarliest;
    case 'handOver':
      return clock.handOverTo ?? today;
    case 'release':
    case 'late':
      return clock.releaseLatest;
    default:
      return clock.releaseEarliest;
  }
}

const byNext = (a: HoldToday, b: HoldToday) =>
  a.nextOn === b.nextOn ? (a.hold.id < b.hold.id ? -1 : 1) : a.nextOn < b.nextOn ? -1 : 1;
