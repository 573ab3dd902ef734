import { BadValue, finite } from '../badValue';
import { addDays, type Day, daysBetween } from '../days';
import { type Development, developmentFrom, isBeyondTrust, type Pace } from './development';
import { mean, type TemperatureReading } from './waterTemperature';

/** Days between which she must have spawned, the same when the spawn was seen. */
export type SpawnInterval = { spawnEarliest: Day; spawnLatest: Day };

/** Where the young are on the way: in the mouth or on the rock. `guarded`: feeding, with the parents still at them. */
export type BroodStage = 'egg' | 'wriggler' | 'fry' | 'guarded';

/**
 * How a species carries its young: `strips` (the female holds and may be stripped), `holds` (never stripped), `handsOver`
 * (female, then male) or `guards` (eggs on rock; "release" is the day the young swim free).
 */
export type CareKind = 'strips' | 'holds' | 'handsOver' | 'guards';

/** Where events fall, as shares of the way to release (for guards, to swimming free). */
export type Landmarks = {
  kind: CareKind;
  spreadDays: number;
  hatchShare: number;
  swimShare: number;
  strip: readonly [from: number, to: number] | null;
  handOver: readonly [from: number, to: number] | null;
};

export type Clock = SpawnInterval & {
  kind: CareKind;
  today: Day;
  /** The middle of the spawn interval; the day of the spawn is day 1. */
  startedOn: Day;
  day: number;
  /** Share of the way; over 1 when she is overdue. */
  progress: number;
  stage: BroodStage;
  hatchOn: Day;
  freeSwimmingOn: Day;
  stripFrom: Day | null;
  stripTo: Day | null;
  handOverFrom: Day | null;
  handOverTo: Day | null;
  releaseOn: Day;
  releaseEarliest: Day;
  releaseLatest: Day;
  /** What the dates rest on: days with a reading so far, the mean used, and whether the rate can be trusted there. */
  temperature: { measuredDays: number; meanC: number; beyondTrust: boolean };
};

/** Runs the clock of a brood that is held or guarded. Throws `BadValue` for dates the wrong way round. */
export function runClock(
  spawn: SpawnInterval,
  pace: Pace,
  marks: Landmarks,
  readings: TemperatureReading[],
  today: Day,
): Clock {
  const { spawnEarliest, spawnLatest } = spawn;
  const span = daysBetween(spawnEarliest, spawnLatest);
  if (span < 0) throw new BadValue('Latest day of the spawn', spawnLatest, `must not be before ${spawnEarliest}`);
  const sinceEarliest = daysBetween(spawnEarliest, today);
  if (sinceEarliest < 0) throw new BadValue('Today', today, `must not be before the spawn on ${spawnEarliest}`);
  const development = developmentFrom(spawnEarliest, pace, readings);
  const middle = span / 2;
  const dayAt = (share: number, from = middle) => addDays(spawnEarliest, Math.round(development.until(share, from)));
  const spread = Math.round(finite('Spread of release', marks.spreadDays, { min: 0, max: 200 }));
  const startedOn = addDays(spawnEarliest, Math.round(middle));
  const progress = Math.max(0, development.after(sinceEarliest) - development.after(middle));
  const stages = {
    kind: marks.kind,
    hatchOn: dayAt(marks.hatchShare),
    freeSwimmingOn: dayAt(marks.swimShare),
    releaseLatest: addDays(dayAt(1, span), spread),
  };
  return {
    ...stages,
    spawnEarliest,
    spawnLatest,
    today,
    startedOn,
    day: Math.max(1, daysBetween(startedOn, today) + 1),
    progress,
    stage: stageOn(stages, today),
    stripFrom: marks.strip && dayAt(marks.strip[0]),
    stripTo: marks.strip && dayAt(marks.strip[1]),
    handOverFrom: marks.handOver && dayAt(marks.handOver[0]),
    handOverTo: marks.handOver && dayAt(marks.handOver[1]),
    releaseOn: dayAt(1),
    releaseEarliest: addDays(dayAt(1, 0), -spread),
    temperature: temperatureSoFar(readings, development, spawnEarliest, sinceEarliest),
  };
}

/** The stage on any day of the clock, so that the words and the bars never disagree. */
export function stageOn(
  {
    kind,
    hatchOn,
    freeSwimmingOn,
    releaseLatest,
  }: Pick<Clock, 'kind' | 'hatchOn' | 'freeSwimmingOn' | 'releaseLatest'>,
  on: Day,
): BroodStage {
  if (on < hatchOn) return 'egg';
  if (on < freeSwimmingOn) return 'wriggler';
  return kind === 'guards' && on > releaseLatest ? 'guarded' : 'fry';
}

function temperatureSoFar(readings: TemperatureReading[], development: Development, start: Day, days: number) {
  const used = Array.from({ length: days + 1 }, (_, i) => development.celsius(i));
  const today = addDays(start, days);
  const measured = new Set(readings.filter(({ on }) => on >= start && on <= today).map(({ on }) => on));
  return { measuredDays: measured.size, meanC: mean(used), beyondTrust: used.some(isBeyondTrust) };
}

/** Whether a day lies in a window, both ends included; never in one that does not exist. */
export const isWithin = (on: Day, from: Day | null, to: Day | null): boolean =>
  from !== null && to !== null && on >= from && on <= to;
