import { addDays, type Day, daysBetween } from '../days';
import { sampleStats } from './sampleStats';

export type Measure = 'total' | 'standard';

/** One sample as the forecast takes it; lengths in mm. */
export type SampleTaken = { onDay: Day; measure: Measure; lengthsMm: number[] };

/** The days between which the spawn lies: what age counts from. */
export type SpawnDays = { spawnEarliest: Day; spawnLatest: Day };

/** The mean and spread of one day's lengths, as the chart draws them. */
export type SamplePoint = {
  onDay: Day;
  ageDays: number;
  n: number;
  meanMm: number;
  sdMm: number | null;
  cv: number | null;
  /** Measured before the batch was last sorted by size: drawn, but not part of how it grows now. */
  beforeGrading: boolean;
};

/** The day that ages count from: the middle of the spawn interval. */
export const bornOn = ({ spawnEarliest, spawnLatest }: SpawnDays): Day =>
  addDays(spawnEarliest, Math.floor(daysBetween(spawnEarliest, spawnLatest) / 2));

/** Total or standard length: as last measured. The two are never mixed. */
export function measureOf(samples: SampleTaken[]): Measure {
  const lastDay = samples
    .map(({ onDay }) => onDay)
    .sort()
    .at(-1);
  return samples.findLast(({ onDay }) => onDay === lastDay)?.measure ?? 'total';
}

/** A day's samples as one, oldest day first; days measured the other way are left out and counted. */
export function samplesByDay(samples: SampleTaken[]): { measure: Measure; days: SampleTaken[]; leftOut: number } {
  const measured = samples.filter(({ lengthsMm }) => lengthsMm.length > 0);
  const measure = measureOf(measured);
  const byDay = new Map<Day, number[]>();
  let leftOut = 0;
  for (const { onDay, lengthsMm, measure: own } of measured) {
    if (own === measure) byDay.set(onDay, [...(byDay.get(onDay) ?? []), ...lengthsMm]);
    else leftOut += lengthsMm.length;
  }
  const days = [...byDay].map(([onDay, lengthsMm]) => ({ onDay, measure, lengthsMm }));
  return { measure, days: days.sort((a, b) => (a.onDay < b.onDay ? -1 : 1)), leftOut };
}

export function pointOf({ onDay, lengthsMm }: SampleTaken, born: Day, gradedOn: Day | null): SamplePoint {
  const { n, mean, sd, cv } = sampleStats(lengthsMm);
  const ageDays = ageOn(born, onDay);
  return { onDay, ageDays, n, meanMm: mean, sdMm: sd, cv, beforeGrading: gradedOn !== null && onDay < gradedOn };
}

/** Days since the spawn. A day within the spawn interval may lie before its middle, and then the age is zero. */
export const ageOn = (born: Day, day: Day): number => Math.max(0, daysBetween(born, day));
