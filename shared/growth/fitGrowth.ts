import { BadValue, finite } from '../badValue';
import { GROWTH_MODELS, type GrowthModel, SHAPES } from './curves';
import { GrowthError } from './growthError';
import {
  type AgeGroup,
  bestCurve,
  type Curve,
  inverse,
  jacobianRow,
  normalEquations,
  type Problem,
  type Pull,
  squares,
} from './leastSquares';
import { studentT } from './studentT';

export type { GrowthModel } from './curves';

export type LengthAtAge = { ageDays: number; lengthMm: number };
/** What the species' adult size says about Linf before the data do. */
export type AsymptotePrior = { meanMm: number; sdMm: number };
export type GrowthOptions = {
  models?: GrowthModel[];
  asymptotePrior?: AsymptotePrior;
  /** Fixes t0 of the von Bertalanffy curve at 0. */
  vonBertalanffyOriginFixed?: boolean;
};

export type LengthBand = { mean: number; low: number; high: number; predictionLow: number; predictionHigh: number };

export type GrowthFit = {
  model: GrowthModel;
  /** `linfMm`, `kPerYear`, and `t0Days` or `tiDays`. */
  parameters: Record<string, number>;
  standardErrors: Record<string, number>;
  residualSdMm: number;
  residualSumOfSquares: number;
  n: number;
  /** With sigma counted as a parameter; null where n is too small for the correction. */
  aicc: number | null;
  /** Every model that could be fitted, best first, with its Akaike weight. */
  candidates: { model: GrowthModel; aicc: number | null; weight: number }[];
  usedPrior: boolean;
  /** `low` and `high` bound the mean, `predictionLow` and `predictionHigh` single fish. */
  lengthAt(ageDays: number, level?: number): LengthBand;
  /** When the mean reaches a length; null where it never does. */
  ageAt(lengthMm: number, level?: number): { mean: number; low: number; high: number } | null;
};

export const DAYS_PER_YEAR = 365.25;
const OLDEST_DAYS = 60 * DAYS_PER_YEAR;

/**
 * Fits growth curves to individual lengths (mm) at age (days) by least squares and keeps the one with the lowest AICc
 * (Burnham & Anderson 2002; sigma counts as a parameter). With `asymptotePrior` Linf is drawn towards it by penalised
 * likelihood, weighed against the residual variance; the standard errors then include it. Intervals use Student's t.
 * Throws `BadValue` for a length or age that is no number or not above zero, `GrowthError` for too few points or ages.
 */
export function fitGrowth(samples: LengthAtAge[], options: GrowthOptions = {}): GrowthFit {
  const { models = [...GROWTH_MODELS], asymptotePrior, vonBertalanffyOriginFixed = false } = options;
  if (models.length === 0) throw new GrowthError('noModel', 'Name at least one curve');
  if (asymptotePrior) {
    finite('Prior mean length', asymptotePrior.meanMm, { above: 0 });
    finite('Prior standard deviation', asymptotePrior.sdMm, { above: 0 });
  }
  const data = dataOf(samples);
  const fewest = asymptotePrior ? 3 : 4;
  const fixed = vonBertalanffyOriginFixed && models.every((model) => model === 'vonBertalanffy');
  if (data.groups.length < (fixed ? 2 : fewest))
    throw new GrowthError('tooFewAges', `Lengths at ${fewest} different ages are needed`);
  const fitted = models.flatMap(
    (model) =>
      fitOne(model, data, asymptotePrior ?? null, vonBertalanffyOriginFixed && model === 'vonBertalanffy') ?? [],
  );
  const ranked = fitted.sort((a, b) => (a.aicc ?? a.deviance) - (b.aicc ?? b.deviance));
  const [best] = ranked;
  if (!best) throw new GrowthError('notIdentifiable', 'No growth curve describes these lengths');
  return asFit(best, ranked, data.n, asymptotePrior !== undefined);
}

type Data = { groups: AgeGroup[]; n: number; within: number };

/** Lengths by age; the squares within an age are the same for every curve. */
function dataOf(samples: LengthAtAge[]): Data {
  const byAge = new Map<number, number[]>();
  for (const { ageDays, lengthMm } of samples) {
    finite('Age in days', ageDays);
    finite('Length', lengthMm, { above: 0 });
    const list = byAge.get(ageDays);
    if (list) list.push(lengthMm);
    else byAge.set(ageDays, [lengthMm]);
  }
  let within = 0;
  const groups = [...byAge].map(([age, lengths]) => {
    // Sorted, so that the order of the rows never shows in the last digit.
    const sorted = lengths.sort((a, b) => a - b);
    const mean = sorted.reduce((sum, length) => sum + length, 0) / sorted.length;
    within += sorted.reduce((sum, length) => sum + (length - mean) ** 2, 0);
    return { age, n: sorted.length, mean };
  });
  return { groups: groups.sort((a, b) => a.age - b.age), n: samples.length, within };
}

type Fitted = {
  model: GrowthModel;
  curve: Curve;
  covariance: number[][];
  rss: number;
  variance: number;
  df: number;
  deviance: number;
  aicc: number | null;
};

const NO_PULL: Pull = { mean: 0, weight: 0 };
const PRIOR_ROUNDS = 60;

function fitOne(model: GrowthModel, data: Data, prior: AsymptotePrior | null, originFixed: boolean): Fitted | null {
  const { groups, n, within } = data;
  const count = originFixed ? 2 : 3;
  if (n < count + 1) throw new GrowthError('tooFewPoints', `At least ${count + 1} lengths are needed`);
  const problem = (pull: Pull): Problem => ({ shape: SHAPES[model], groups, pull, originFixed });
  let pull = prior ? { mean: prior.meanMm, weight: startVariance(data) / prior.sdMm ** 2 } : NO_PULL;
  let curve = bestCurve(problem(pull));
  // The weight of the prior depends on the residual variance, and that on the curve: a few rounds settle both.
  for (let round = 0; prior && curve && round < PRIOR_ROUNDS; round += 1) {
    const variance = Math.max((within + squares(problem(NO_PULL), curve)) / n, 1e-12);
    const weight = variance / prior.sdMm ** 2;
    if (Math.abs(weight - pull.weight) <= 1e-9 * weight) break;
    pull = { mean: prior.meanMm, weight };
    curve = bestCurve(problem(pull));
  }
  if (!curve || !(curve.linf > 0) || !Number.isFinite(curve.k)) return null;
  const rss = within + squares(problem(NO_PULL), curve);
  const df = n - count;
  const variance = rss / df;
  const weighted = prior ? { mean: prior.meanMm, weight: variance / prior.sdMm ** 2 } : NO_PULL;
  const unscaled = inverse(normalEquations(problem(weighted), curve).matrix);
  if (!unscaled) return null;
  const covariance = unscaled.map((row) => row.map((value) => value * variance));
  const penalty = prior ? ((curve.linf - prior.meanMm) / prior.sdMm) ** 2 : 0;
  const k = count + 1;
  // Noiseless data have no likelihood worth the name: the floor keeps AICc a number.
  const deviance = n * (Math.log((2 * Math.PI * Math.max(rss, 1e-12 * n)) / n) + 1) + penalty + 2 * k;
  const aicc = n > k + 1 ? deviance + (2 * k * (k + 1)) / (n - k - 1) : null;
  return { model, curve, covariance, rss, variance, df, deviance, aicc };
}

const startVariance = ({ within, n, groups }: Data): number =>
  Math.max(within / Math.max(1, n - groups.length), 1e-6 * Math.max(...groups.map(({ mean }) => mean)) ** 2);

function asFit(best: Fitted, ranked: Fitted[], n: number, usedPrior: boolean): GrowthFit {
  const { model, curve, covariance, rss, variance, df, aicc } = best;
  const shape = SHAPES[model];
  const origin = model === 'vonBertalanffy' ? 't0Days' : 'tiDays';
  const se = (i: number) => Math.sqrt(Math.max(0, covariance[i]?.[i] ?? 0));

  const lengthAt = (ageDays: number, level = 0.95): LengthBand => {
    finite('Age in days', ageDays);
    const row = jacobianRow(shape, curve, ageDays);
    const mean = curve.linf * (row[0] ?? 0);
    const spread = Math.max(
      0,
      covariance.reduce(
        (sum, line, i) => sum + line.reduce((part, value, j) => part + value * (row[i] ?? 0) * (row[j] ?? 0), 0),
        0,
      ),
    );
    const t = studentT(level, df);
    const [forMean, forFish] = [t * Math.sqrt(spread), t * Math.sqrt(spread + variance)];
    return {
      mean,
      low: mean - forMean,
      high: mean + forMean,
      predictionLow: mean - forFish,
      predictionHigh: mean + forFish,
    };
  };

  const meanAge = (lengthMm: number): number => curve.m + shape.inverse(lengthMm / curve.linf) / curve.k;

  return {
    model,
    parameters: { linfMm: curve.linf, kPerYear: curve.k * DAYS_PER_YEAR, [origin]: curve.m },
    standardErrors: { linfMm: se(0), kPerYear: se(1) * DAYS_PER_YEAR, [origin]: se(2) },
    residualSdMm: Math.sqrt(variance),
    residualSumOfSquares: rss,
    n,
    aicc,
    candidates: weightsOf(ranked),
    usedPrior,
    lengthAt,
    ageAt: (lengthMm, level = 0.95) => {
      finite('Length', lengthMm);
      if (lengthMm <= 0 || lengthMm >= curve.linf) return null;
      const mean = meanAge(lengthMm);
      if (!Number.isFinite(mean)) throw new BadValue('Length', lengthMm, 'is beyond what the curve can tell');
      const band = lengthAt(mean, level);
      const slope = curve.linf * curve.k * shape.slope(curve.k * (mean - curve.m), lengthMm / curve.linf);
      const aside = (band.high - band.mean) / slope;
      return {
        mean,
        low: crossing((age) => lengthAt(age, level).high - lengthMm, mean - 4 * aside, mean) ?? mean - aside,
        high:
          crossing((age) => lengthAt(age, level).low - lengthMm, mean, Math.min(mean + 12 * aside, OLDEST_DAYS)) ??
          mean + aside,
      };
    },
  };
}

/** Where a rising function passes zero between two ages; null where it does not. */
function crossing(difference: (age: number) => number, from: number, to: number): number | null {
  if (!(difference(from) <= 0 && difference(to) >= 0)) return null;
  let [low, high] = [from, to];
  for (let i = 0; i < 100 && high - low > 1e-9 * Math.max(1, Math.abs(high)); i += 1) {
    const middle = (low + high) / 2;
    if (difference(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

function weightsOf(ranked: Fitted[]): GrowthFit['candidates'] {
  const scores = ranked.map(({ aicc, deviance }) => aicc ?? deviance);
  const least = Math.min(...scores);
  const raw = scores.map((score) => Math.exp((least - score) / 2));
  const sum = raw.reduce((total, weight) => total + weight, 0);
  return ranked.map(({ model, aicc }, i) => ({ model, aicc, weight: (raw[i] ?? 0) / sum }));
}
