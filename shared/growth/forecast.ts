import { addDays, type Day, daysBetween } from '../days';
import type { AdultSizePrior } from '../species/adultSize';
import { type AsymptotePrior, fitGrowth, type GrowthFit } from './fitGrowth';
import { GrowthError } from './growthError';
import { sampleStats, shareAtLeast } from './sampleStats';

/** One sample as the forecast takes it; lengths in mm. */
export type SampleTaken = { onDay: Day; measure: 'total' | 'standard'; lengthsMm: number[] };

export type GrowthFacts = {
  samples: SampleTaken[];
  /** What age counts from: the days between which the spawn lies. */
  spawnEarliest: Day;
  spawnLatest: Day;
  today: Day;
  prior: Pick<AdultSizePrior, 'meanMm' | 'sdMm'> | null;
};

/** The mean and spread of one day's lengths, as the chart draws them. */
export type SamplePoint = {
  onDay: Day;
  ageDays: number;
  n: number;
  meanMm: number;
  sdMm: number | null;
  cv: number | null;
};

export type Forecast = {
  measure: 'total' | 'standard';
  points: SamplePoint[];
  /** Lengths taken the other way, which are left out: the two are never mixed. */
  leftOut: number;
} & (
  | { kind: 'none' }
  | { kind: 'pointsOnly'; needs: number }
  | { kind: 'notIdentifiable' }
  | { kind: 'stale'; fit: GrowthFit; last: SamplePoint; daysSince: number }
  | {
      kind: 'curve';
      fit: GrowthFit;
      cv: number;
      cvAssumed: boolean;
      priorDecides: boolean;
      bornOn: Day;
      lastOn: Day;
      n: number;
    }
);

/** A forecast needs so many sample dates, and none reaches further than this past the last. */
export const DATES_NEEDED = 3;
export const STALE_AFTER_DAYS = 60;
/** Until the fish have grown to this share of the species' adult length, the species decides where the curve ends. */
const JUVENILE_SHARE = 0.6;
/** Unevenness of a brood that nobody has measured enough fish of. Common practice, no source. */
const USUAL_CV = 0.1;
const CV_FROM = 5;

/** The day that ages count from: the middle of the spawn interval. */
export const bornOn = ({ spawnEarliest, spawnLatest }: Pick<GrowthFacts, 'spawnEarliest' | 'spawnLatest'>): Day =>
  addDays(spawnEarliest, Math.floor(daysBetween(spawnEarliest, spawnLatest) / 2));

/**
 * What a brood's samples say about its growth, and no more: points alone under three sample dates; the last measured size
 * when the last sample is over 60 days old; else a curve, with the species' adult size as a prior. `priorDecides` is true
 * while the data are juvenile only. Of two kinds of length the one last used counts.
 */
export function forecast(facts: GrowthFacts): Forecast {
  const { samples, today, prior } = facts;
  const ordered = samples
    .filter(({ lengthsMm }) => lengthsMm.length > 0)
    .toSorted((a, b) => (a.onDay < b.onDay ? -1 : a.onDay > b.onDay ? 1 : 0));
  const measure = ordered.at(-1)?.measure ?? 'total';
  const used = ordered.filter((sample) => sample.measure === measure);
  const leftOut = ordered
    .filter((sample) => sample.measure !== measure)
    .reduce((sum, { lengthsMm }) => sum + lengthsMm.length, 0);
  const born = bornOn(facts);
  const points = pointsOf(used, born);
  const base = { measure, points, leftOut };
  const last = points.at(-1);
  if (!last) return { ...base, kind: 'none' };
  if (points.length < DATES_NEEDED) return { ...base, kind: 'pointsOnly', needs: DATES_NEEDED - points.length };
  const fit = fitOf(used, born, prior);
  if (!fit) return { ...base, kind: 'notIdentifiable' };
  const daysSince = daysBetween(last.onDay, today);
  if (daysSince > STALE_AFTER_DAYS) return { ...base, kind: 'stale', fit, last, daysSince };
  const { cv, cvAssumed } = unevenness(points);
  const longest = Math.max(...points.map(({ meanMm }) => meanMm));
  return {
    ...base,
    kind: 'curve',
    fit,
    cv,
    cvAssumed,
    priorDecides: prior !== null && longest < JUVENILE_SHARE * prior.meanMm,
    bornOn: born,
    lastOn: last.onDay,
    n: fit.n,
  };
}

function pointsOf(samples: SampleTaken[], born: Day): SamplePoint[] {
  const byDay = new Map<Day, number[]>();
  for (const { onDay, lengthsMm } of samples) byDay.set(onDay, [...(byDay.get(onDay) ?? []), ...lengthsMm]);
  return [...byDay].map(([onDay, lengths]) => {
    const { n, mean, sd, cv } = sampleStats(lengths);
    return { onDay, ageDays: daysBetween(born, onDay), n, meanMm: mean, sdMm: sd, cv };
  });
}

function fitOf(samples: SampleTaken[], born: Day, prior: AsymptotePrior | null): GrowthFit | null {
  const lengths = samples.flatMap(({ onDay, lengthsMm }) =>
    lengthsMm.map((lengthMm) => ({ ageDays: daysBetween(born, onDay), lengthMm })),
  );
  try {
    return fitGrowth(lengths, prior ? { asymptotePrior: { meanMm: prior.meanMm, sdMm: prior.sdMm } } : {});
  } catch (error) {
    if (error instanceof GrowthError) return null;
    throw error;
  }
}

/** The spread of the last sample that is large enough to show one. */
function unevenness(points: SamplePoint[]): { cv: number; cvAssumed: boolean } {
  const shown = points.findLast(({ n, cv }) => n >= CV_FROM && cv !== null && cv > 0);
  return shown?.cv ? { cv: shown.cv, cvAssumed: false } : { cv: USUAL_CV, cvAssumed: true };
}

/** A date with its 95 % interval. */
export type DateRange = { on: Day; from: Day; to: Day };
export type Target = { lengthMm: number; half: DateRange | null; fourFifths: DateRange | null };

/** Standard deviations above which four fifths of a normal distribution lie. */
const FOUR_FIFTHS = 0.8416212335729143;

/** When half, and four fifths, of the batch are at or over a length; null where the curve never takes them there. */
export function targetOf(curve: Extract<Forecast, { kind: 'curve' }>, lengthMm: number): Target {
  const { fit, cv } = curve;
  const dateOf = (meanMm: number): DateRange | null => {
    const age = fit.ageAt(meanMm);
    return (
      age && {
        on: dayAt(curve.bornOn, age.mean),
        from: dayAt(curve.bornOn, age.low),
        to: dayAt(curve.bornOn, age.high),
      }
    );
  };
  const later = 1 - FOUR_FIFTHS * cv;
  return { lengthMm, half: dateOf(lengthMm), fourFifths: later > 0 ? dateOf(lengthMm / later) : null };
}

const FURTHEST_DAYS = 20_000;
const dayAt = (born: Day, age: number): Day =>
  addDays(born, Math.round(Math.max(-FURTHEST_DAYS, Math.min(FURTHEST_DAYS, age))));

/** Mean length on a day, by the curve. */
export const meanOn = (curve: Extract<Forecast, { kind: 'curve' }>, day: Day): number =>
  curve.fit.lengthAt(daysBetween(curve.bornOn, day)).mean;

/** How many of so many heads are at or over a length on a day: the expected number, rounded down. */
export function headsAtLeast(
  curve: Extract<Forecast, { kind: 'curve' }>,
  lengthMm: number,
  heads: number,
  day: Day,
): number {
  const meanMm = meanOn(curve, day);
  return meanMm <= 0 ? 0 : Math.floor(heads * shareAtLeast(lengthMm, { meanMm, cv: curve.cv }) + 1e-9);
}
