import { finite, whole } from '../badValue';
import { type Day, daysBetween } from '../days';
import { normalQuantile } from '../growth/studentT';

export type Interval = { share: number; low: number; high: number };

/**
 * A share with Wilson's score interval (Wilson 1927). It takes fish to die independently; a tank crash breaks that, and the
 * true uncertainty is then wider. Throws `BadValue` for more successes than trials, or no trials.
 */
export function wilson(successes: number, trials: number, confidence = 0.95): Interval {
  whole('Trials', trials, 1);
  finite('Successes', whole('Successes', successes), { max: trials });
  const z = normalQuantile(confidence);
  const share = successes / trials;
  const down = 1 + z ** 2 / trials;
  const middle = (share + z ** 2 / (2 * trials)) / down;
  const aside = (z / down) * Math.sqrt((share * (1 - share)) / trials + z ** 2 / (4 * trials ** 2));
  // At the ends the formula is exact; rounding must not take it a hair outside.
  return {
    share,
    low: successes === 0 ? 0 : Math.max(0, middle - aside),
    high: successes === trials ? 1 : Math.min(1, middle + aside),
  };
}

type Counted = { count: number; day: number };

/**
 * Instantaneous mortality Z per day: -ln(Nt / N0) / t. Null where nobody is left (Z is without bound) or no time has passed.
 * Throws `BadValue` when more are counted later: that is a count to look at, not a rate.
 */
export function mortalityRate(from: Counted, to: Counted): number | null {
  whole('First count', from.count, 1);
  finite('Later count', whole('Later count', to.count), { max: from.count });
  const days = finite('Day', to.day) - finite('Day', from.day);
  if (to.count === 0 || days <= 0) return null;
  return Math.log(from.count / to.count) / days;
}

export type SurvivalStep = {
  time: number;
  atRisk: number;
  deaths: number;
  survival: number;
  standardError: number;
  low: number;
  high: number;
};

/**
 * Kaplan & Meier's survival (1958) for fish followed one by one: `died` false for those sold, moved or still alive at
 * `time`. Greenwood's standard error; limits on the log-log scale, so that they stay between 0 and 1. One row for each time
 * at which somebody died; a row with survival 0 has no limits of its own and repeats 0.
 */
export function kaplanMeier(fates: { time: number; died: boolean }[], confidence = 0.95): SurvivalStep[] {
  const z = normalQuantile(confidence);
  const times = [...new Set(fates.filter(({ died }) => died).map(({ time }) => finite('Time', time, { min: 0 })))].sort(
    (a, b) => a - b,
  );
  let [survival, greenwood] = [1, 0];
  return times.map((time) => {
    const atRisk = fates.filter((fate) => fate.time >= time).length;
    const deaths = fates.filter((fate) => fate.died && fate.time === time).length;
    survival *= 1 - deaths / atRisk;
    if (atRisk === deaths) return { time, atRisk, deaths, survival: 0, standardError: 0, low: 0, high: 0 };
    greenwood += deaths / (atRisk * (atRisk - deaths));
    const aside = (z * Math.sqrt(greenwood)) / Math.abs(Math.log(survival));
    return {
      time,
      atRisk,
      deaths,
      survival,
      standardError: survival * Math.sqrt(greenwood),
      low: survival ** Math.exp(aside),
      high: survival ** Math.exp(-aside),
    };
  });
}

export type StageStep = { stage: string; n: number; step: number; survival: Interval };

/** Survival from stage to stage and from the first count on, with Wilson's interval about the latter. Egg counts may be estimates. */
export function stageSurvival(stages: { stage: string; n: number }[]): StageStep[] {
  const first = stages[0]?.n ?? 0;
  return stages
    .slice(1)
    .map(({ stage, n }, i) => ({ stage, n, step: n / (stages[i]?.n ?? n), survival: wilson(n, first) }));
}

/** "85 %, between 71 and 94 %", from the heads that opened the count and the deaths since. */
export function survivalWords(interval: Interval): string {
  const percent = (share: number) => Math.round(share * 100);
  return `${percent(interval.share)} %, between ${percent(interval.low)} and ${percent(interval.high)} %`;
}

/** Age on a day, counted from the middle of the spawn interval. */
export const ageOn = (spawnEarliest: Day, spawnLatest: Day, day: Day): number =>
  daysBetween(spawnEarliest, day) - Math.floor(daysBetween(spawnEarliest, spawnLatest) / 2);
