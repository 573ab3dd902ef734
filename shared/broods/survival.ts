import { BadValue, finite, whole } from '../badValue';
import { type Day, daysBetween } from '../days';
import { normalReach } from '../growth/normal';
import type { LedgerEntry } from './headEntry';
import { replay, standingEntries } from './headReplay';

export type Interval = { share: number; low: number; high: number };

/**
 * A share of 0 to 1 with its score interval (Wilson 1927, J Am Stat Assoc 22:209), without continuity correction. It
 * takes fish to live or die each for itself; after a tank crash the true range is wider. Null without trials. Throws
 * `BadValue` for what is not a count, or more successes than trials.
 */
export function wilson(successes: number, trials: number, confidence = 0.95): Interval | null {
  finite('Successes', whole('Successes', successes), { max: whole('Trials', trials) });
  const z = normalReach(confidence);
  if (trials === 0) return null;
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
 * Instantaneous mortality Z a day: -ln(Nt / N0) / t (Ricker 1975). Null when nobody was there or is left, for Z is then
 * without bound, or when no time has passed. Throws `BadValue` when more are counted later: a count to look at, not a
 * rate.
 */
export function mortalityRate(from: Counted, to: Counted): number | null {
  const first = whole('First count', from.count);
  finite('Later count', whole('Later count', to.count), { max: first });
  const days = finite('Later day', to.day) - finite('First day', from.day);
  return to.count > 0 && days > 0 ? Math.log(first / to.count) / days : null;
}

/** Deaths at a time, in days, among the fish that were there to die. */
export type Deaths = { time: number; atRisk: number; deaths: number };

/** `standardError` and limits are null when nobody is left: there is nothing to be unsure about, and no formula. */
export type SurvivalStep = Deaths & {
  survival: number;
  standardError: number | null;
  low: number | null;
  high: number | null;
};

/**
 * Kaplan & Meier's survival (1958, J Am Stat Assoc 53:457) for fish followed to a `time` in days: `died` false for
 * those sold, moved or alive; `heads` fish share a line, one if left out. Greenwood's standard error, limits on the
 * log-log scale. One row for each time at which fish died; deaths come before departures of the same day. It takes fish
 * to die each for itself: after a tank crash the true range is wider. Throws `BadValue`.
 */
export function kaplanMeier(
  fates: { time: number; died: boolean; heads?: number }[],
  confidence = 0.95,
): SurvivalStep[] {
  const byTime = new Map<number, { died: number; left: number }>();
  for (const { time, died, heads = 1 } of fates) {
    const there = byTime.get(finite('Time', time, { min: 0 })) ?? { died: 0, left: 0 };
    there[died ? 'died' : 'left'] += whole('Heads', heads, 1);
    byTime.set(time, there);
  }
  let atRisk = [...byTime.values()].reduce((sum, { died, left }) => sum + died + left, 0);
  const deaths = [...byTime]
    .sort(([a], [b]) => a - b)
    .map(([time, { died, left }]) => {
      const row = { time, atRisk, deaths: died };
      atRisk -= died + left;
      return row;
    });
  return survivalOf(deaths, confidence);
}

/**
 * The same from deaths and the fish at risk before them, oldest last: for fish that join later and count from then on.
 * Rows without deaths are left out. Throws `BadValue` when more die than are there.
 */
export function survivalOf(deaths: Deaths[], confidence = 0.95): SurvivalStep[] {
  const z = normalReach(confidence);
  let [survival, greenwood] = [1, 0];
  return deaths
    .filter((row) => whole('Deaths', row.deaths) > 0)
    .map((row) => {
      const left = row.atRisk - finite('Deaths', row.deaths, { max: whole('Fish at risk', row.atRisk) });
      survival *= left / row.atRisk;
      if (survival === 0) return { ...row, survival, standardError: null, low: null, high: null };
      greenwood += row.deaths / (row.atRisk * left);
      const aside = (z * Math.sqrt(greenwood)) / -Math.log(survival);
      const [low, high] = [survival ** Math.exp(aside), survival ** Math.exp(-aside)];
      return { ...row, survival, standardError: survival * Math.sqrt(greenwood), low, high };
    });
}

/**
 * Survival by age, in days since the spawn, out of a batch's ledger: only losses are deaths. Fish sold, moved, held
 * back or culled, and those not found at a count, leave without having died; fish moved in count from then on. Throws
 * `BadValue` for a bad ledger.
 */
export function survivalByAge(entries: LedgerEntry[], bornOn: Day, confidence = 0.95): SurvivalStep[] {
  const days = new Map<Day, Deaths>();
  for (const { entry, balance, change, short } of replay(standingEntries(entries))) {
    if (entry.kind !== 'loss') continue;
    // Heads found dead beyond those on the books were alive until then, and so at risk.
    const row = { time: daysBetween(bornOn, entry.on), atRisk: balance - change + short, deaths: entry.heads };
    const earlier = days.get(entry.on);
    if (earlier) earlier.deaths += row.deaths;
    else days.set(entry.on, row);
  }
  return survivalOf(
    [...days.values()].filter(({ deaths, atRisk }) => deaths <= atRisk),
    confidence,
  );
}

export type StageStep = { stage: string; n: number; step: number | null; survival: Interval };

/**
 * Survival from each stage to the next and from the first count on, the latter with Wilson's interval; empty when the
 * first count is zero. Egg counts may be estimates, and then so is what follows. Throws `BadValue` naming a stage with
 * more fish than the one before it.
 */
export function stageSurvival(stages: { stage: string; n: number }[]): StageStep[] {
  const first = whole('First count', stages[0]?.n ?? 0);
  return stages.slice(1).flatMap(({ stage, n }, i) => {
    const before = stages[i]?.n ?? 0;
    if (whole(stage, n) > before) throw new BadValue(stage, n, `at most the ${before} counted before are possible`);
    const survival = wilson(n, first);
    return survival ? [{ stage, n, step: before > 0 ? n / before : null, survival }] : [];
  });
}

/** "85 %, between 70 and 94 %", from the heads that opened the count and the deaths since. */
export function survivalWords(interval: Interval): string {
  const percent = (share: number) => Math.round(share * 100);
  return `${percent(interval.share)} %, between ${percent(interval.low)} and ${percent(interval.high)} %`;
}

/** Age on a day, counted from the middle of the spawn interval. */
export const ageOn = (spawnEarliest: Day, spawnLatest: Day, day: Day): number =>
  daysBetween(spawnEarliest, day) - Math.floor(daysBetween(spawnEarliest, spawnLatest) / 2);
