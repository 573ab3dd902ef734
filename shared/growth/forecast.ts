import { addDays, type Day, daysBetween } from '../days';
import type { LengthAtAge } from './ageGroups';
import { meanOf, standardErrorOf } from './bands';
import { CannotFit, type CannotFitReason } from './cannotFit';
import { fitGrowth, type GrowthFit, type GrowthOptions } from './fitGrowth';
import type { AsymptotePrior } from './fitModel';
import {
  ageOn,
  bornOn,
  type Measure,
  pointOf,
  type SamplePoint,
  type SampleTaken,
  type SpawnDays,
  samplesByDay,
} from './points';
import type { BatchSize } from './sizes';

export type GrowthFacts = SpawnDays & {
  samples: SampleTaken[];
  today: Day;
  /** The species' adult length, measured as `measureOf(samples)` says. */
  prior: AsymptotePrior | null;
  /** Fish in the batch, to tell whether the same ones are measured each time. */
  heads?: number | null;
  /** When the batch was last sorted by size: lengths before that do not tell how it grows now. */
  gradedOn?: Day | null;
};

type Unevenness = {
  cv: number;
  /** Standard error of `cv`. */
  cvSd: number;
  cvAssumed: boolean;
};

export type CurveForecast = Unevenness & {
  kind: 'curve';
  fit: GrowthFit;
  /** The final length is the species', not these data's. */
  priorDecides: boolean;
  /** Three sample days and no prior: length is taken as zero at the spawn. */
  originFixed: boolean;
  /** Nearly all fish are measured each time, so the samples are not new evidence and the bands are too narrow. */
  sameFish: boolean;
  bornOn: Day;
  lastOn: Day;
  /** The last day that the curve speaks for; dates beyond it are said to be far. */
  untilDay: Day;
  n: number;
};

type NoCurve =
  | { kind: 'none' }
  | { kind: 'pointsOnly'; needs: number; last: SamplePoint }
  | { kind: 'notIdentifiable'; reason: CannotFitReason; last: SamplePoint }
  | { kind: 'stale'; last: SamplePoint; daysSince: number };

export type Forecast = {
  measure: Measure;
  points: SamplePoint[];
  /** Lengths taken the other way, which are left out. */
  leftOut: number;
} & (NoCurve | CurveForecast);

/** A forecast needs so many sample days, and none reaches further than this past the last. */
export const DAYS_NEEDED = 3;
export const STALE_AFTER_DAYS = 60;
/** Unevenness of a brood of which nobody has measured enough fish, and how sure that is. Common practice, no source. */
const USUAL_CV = 0.1;
const USUAL_CV_SD = 0.03;
const FISH_FOR_CV = 5;
/** From this share of the batch on, each sample is the same fish again. */
const SAME_FISH_FROM = 0.5;

/**
 * What a brood's samples say about its growth, and no more: points alone under three sample days; the last measured
 * size when the last sample is over 60 days old; else a curve, for which the species' adult size stands in while the
 * fish are small. Of total and standard length the one last used counts. Throws `BadValue` for lengths or days that
 * cannot be.
 */
export function forecast(facts: GrowthFacts): Forecast {
  const { measure, days, leftOut } = samplesByDay(facts.samples);
  const born = bornOn(facts);
  const points = days.map((day) => pointOf(day, born, facts.gradedOn ?? null));
  return { measure, points, leftOut, ...judged(facts, days, points) };
}

function judged(facts: GrowthFacts, days: SampleTaken[], points: SamplePoint[]): NoCurve | CurveForecast {
  const last = points.at(-1);
  if (!last) return { kind: 'none' };
  const used = days.filter((_, i) => !points[i]?.beforeGrading);
  if (used.length < DAYS_NEEDED) return { kind: 'pointsOnly', needs: DAYS_NEEDED - used.length, last };
  const daysSince = daysBetween(last.onDay, facts.today);
  if (daysSince > STALE_AFTER_DAYS) return { kind: 'stale', last, daysSince };
  const fitted = fitOf(facts, used);
  if (fitted instanceof CannotFit) return { kind: 'notIdentifiable', reason: fitted.reason, last };
  const { fit, originFixed } = fitted;
  const fishADay = fit.n / used.length;
  return {
    kind: 'curve',
    fit,
    ...unevennessOf(points),
    priorDecides: fit.usedPrior,
    originFixed,
    sameFish: Boolean(facts.heads && fishADay >= SAME_FISH_FROM * facts.heads),
    bornOn: bornOn(facts),
    lastOn: last.onDay,
    untilDay: addDays(last.onDay, STALE_AFTER_DAYS),
    n: fit.n,
  };
}

function fitOf(facts: GrowthFacts, used: SampleTaken[]): { fit: GrowthFit; originFixed: boolean } | CannotFit {
  const born = bornOn(facts);
  const lengths = used.flatMap(({ onDay, lengthsMm }) => {
    const ageDays = ageOn(born, onDay);
    return lengthsMm.map((lengthMm) => ({ ageDays, lengthMm }));
  });
  const fit = tryFit(lengths, facts.prior ? { asymptotePrior: facts.prior } : {});
  if (!(fit instanceof CannotFit)) return { fit, originFixed: false };
  // Fish of unknown birth are counted from their first sample, where they are anything but of no length.
  const first = Math.min(...lengths.map(({ ageDays }) => ageDays));
  if (fit.reason !== 'tooFewAges' || first === 0) return fit;
  const fixed = tryFit(lengths, { models: ['vonBertalanffy'], vonBertalanffyOriginFixed: true });
  return fixed instanceof CannotFit ? fixed : { fit: fixed, originFixed: true };
}

function tryFit(lengths: LengthAtAge[], options: GrowthOptions): GrowthFit | CannotFit {
  try {
    return fitGrowth(lengths, { ...options, spread: 'asMeasured' });
  } catch (error) {
    if (error instanceof CannotFit) return error;
    throw error;
  }
}

/** Of the last sample large enough to show it. Standard error of a CV: Sokal & Rohlf, Biometry. */
function unevennessOf(points: SamplePoint[]): Unevenness {
  const shown = points.findLast(({ n, cv }) => n >= FISH_FOR_CV && cv !== null && cv > 0);
  if (!shown?.cv) return { cv: USUAL_CV, cvSd: USUAL_CV_SD, cvAssumed: true };
  const { n, cv } = shown;
  return { cv, cvSd: cv * Math.sqrt((1 + 2 * cv * cv) / (2 * n)), cvAssumed: false };
}

/** Mean length on a day, by the curve. */
export const meanOn = ({ fit, bornOn: born }: CurveForecast, day: Day): number =>
  Math.max(0, meanOf(fit.curves, daysBetween(born, day)));

/** The size of a batch on a day, with the day it was measured, or null for a day that the curve speaks for. */
export type SizeOnDay = BatchSize & { measuredOn: Day | null };

/**
 * How long the fish of a batch are on a day: by the curve up to 60 days after the last sample, else as last measured,
 * when they have grown since by an unknown amount. Null when never measured. For `headsAtLeast` and the availability
 * page.
 */
export function sizeOn(grown: Forecast, day: Day): SizeOnDay | null {
  const last = grown.points.at(-1);
  if (!last) return null;
  if (grown.kind === 'curve' && day <= grown.untilDay) {
    const seMm = standardErrorOf(grown.fit.curves, daysBetween(grown.bornOn, day));
    const meanMm = meanOn(grown, day);
    if (meanMm > 0) return { meanMm, seMm, cv: grown.cv, cvSd: grown.cvSd, measuredOn: null };
  }
  const { cv, cvSd } = unevennessOf(grown.points);
  const seMm = (last.sdMm ?? cv * last.meanMm) / Math.sqrt(last.n);
  return { meanMm: last.meanMm, seMm, cv, cvSd, measuredOn: last.onDay };
}
