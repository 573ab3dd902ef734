import { type Day, daysBetween, dayWords, formatShortDay } from '../days';
import { type BroodStage, type CareKind, type Clock, isWithin } from './clock';
import { dayNumber } from './dayBars';

export const STAGE_WORDS: Record<BroodStage, string> = {
  egg: 'Eggs',
  wriggler: 'Wrigglers',
  fry: 'Free-swimming',
  guarded: 'Free-swimming, guarded',
};

export const KIND_WORDS: Record<CareKind, string> = {
  strips: 'Holding',
  holds: 'Holding',
  handsOver: 'Holding',
  guards: 'Guarding',
};

/** Said where a strip is recorded. */
export const STRIP_CAUTION =
  'Strip only if you have been shown how: water-wet hands, low over the water, head down. Stop if she struggles and leave her to release.';

/** What the clock says comes next, in order of time; `late` once the release window has passed. */
export type ClockState = 'early' | 'strip' | 'handOver' | 'waiting' | 'release' | 'late' | 'guarded';

/** `plan` is the keeper's: a female left to release has no strip window to act on. */
export function clockState(clock: Clock, plan: 'strip' | 'leave'): ClockState {
  const { today, kind, releaseEarliest, releaseLatest } = clock;
  if (today > releaseLatest) return kind === 'guards' ? 'guarded' : 'late';
  if (plan === 'strip' && isWithin(today, clock.stripFrom, clock.stripTo)) return 'strip';
  if (isWithin(today, clock.handOverFrom, clock.handOverTo)) return 'handOver';
  if (today >= releaseEarliest) return 'release';
  return nextWindow(clock, plan) ? 'early' : 'waiting';
}

/** The strip or hand-over window still ahead, if there is one. */
function nextWindow({ today, stripFrom, handOverFrom }: Clock, plan: 'strip' | 'leave'): Day | null {
  const from = plan === 'strip' ? (stripFrom ?? handOverFrom) : handOverFrom;
  return from !== null && today < from ? from : null;
}

/** The row's trailing words: "Strip from Thu 21 May", "Strip by tomorrow", "Release from Wed 27 May", "Release 3 days late". */
export function nextInClock(clock: Clock, plan: 'strip' | 'leave'): string {
  const { today, kind, releaseEarliest, releaseLatest, hatchOn } = clock;
  const swims = kind === 'guards';
  switch (clockState(clock, plan)) {
    case 'strip':
      return `Strip ${byDay(clock.stripTo ?? today, today)}`;
    case 'handOver':
      return `Hand-over ${byDay(clock.handOverTo ?? today, today)}`;
    case 'early':
      return `${clock.stripFrom ? 'Strip' : 'Hand-over'} from ${dayWords(nextWindow(clock, plan) ?? today, today)}`;
    case 'release':
      return `${swims ? 'Free-swimming' : 'Release'} ${byDay(releaseLatest, today)}`;
    case 'late':
      return `Release ${plural(daysBetween(releaseLatest, today), 'day')} late`;
    case 'guarded':
      return STAGE_WORDS.guarded;
    case 'waiting':
      if (swims && today < hatchOn) return `Hatching about ${dayWords(hatchOn, today)}`;
      return `${swims ? 'Free-swimming' : 'Release'} from ${dayWords(releaseEarliest, today)}`;
  }
}

const byDay = (day: Day, today: Day) => (day === today ? 'today' : `by ${dayWords(day, today)}`);

/** The picture in a sentence: "Day 22. Strip window 21 to 28. Release about 29." */
export function clockSentence(clock: Clock): string {
  const { stripFrom, stripTo, handOverFrom, handOverTo } = clock;
  const window = (name: string, from: Day | null, to: Day | null) =>
    from && to ? [`${name} ${dayNumber(clock, from)} to ${dayNumber(clock, to)}.`] : [];
  return [
    `Day ${clock.day}.`,
    ...window('Strip window', stripFrom, stripTo),
    ...window('Hand-over', handOverFrom, handOverTo),
    `${clock.kind === 'guards' ? 'Free-swimming' : 'Release'} about ${dayNumber(clock, clock.releaseOn)}.`,
    ...(spawnDoubt(clock) ? [`${spawnDoubt(clock)}.`] : []),
  ].join(' ');
}

/** "Spawn not seen, ± 2 days"; empty when it was seen. */
export function spawnDoubt({ spawnEarliest, spawnLatest }: Clock): string {
  const span = daysBetween(spawnEarliest, spawnLatest);
  return span === 0 ? '' : `Spawn not seen, ± ${plural(Math.ceil(span / 2), 'day')}`;
}

/** What the dates rest on, one tap away: learned from how many holds, and the temperatures used. */
export function clockBasis(clock: Clock, basedOn: number): string {
  const { measuredDays, meanC, beyondTrust } = clock.temperature;
  const held =
    basedOn === 0 ? 'The species’ usual days' : `The species’ usual days and ${plural(basedOn, 'hold')} of yours`;
  const warm =
    measuredDays === 0
      ? 'no temperature recorded'
      : `${meanC.toFixed(1)} °C from ${plural(measuredDays, 'day')} of readings`;
  const doubt = beyondTrust ? ' Outside 22 to 30 °C the rate is not known.' : '';
  return `${held}, ${warm}.${doubt}`;
}

const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** "1–8 Jun", "28 May–3 Jun", "16 Jun" when both are one day. */
export function dayRangeWords(from: Day, to: Day): string {
  if (from === to) return formatShortDay(to);
  const isOneMonth = from.slice(0, 7) === to.slice(0, 7);
  return `${isOneMonth ? Number(from.slice(8)) : formatShortDay(from)}–${formatShortDay(to)}`;
}

/** Days by which the release may fall before or after the day it is expected, whichever is more. */
export const releaseDoubtDays = ({ releaseOn, releaseEarliest, releaseLatest }: Clock): number =>
  Math.max(daysBetween(releaseEarliest, releaseOn), daysBetween(releaseOn, releaseLatest));

/** Days that a hold lasted, or has lasted so far: the day of the spawn is day 1. */
export const daysHeld = (
  { spawnEarliest, spawnLatest }: Pick<Clock, 'spawnEarliest' | 'spawnLatest'>,
  on: Day,
): number => Math.max(1, daysBetween(spawnEarliest, on) + 1 - Math.round(daysBetween(spawnEarliest, spawnLatest) / 2));
