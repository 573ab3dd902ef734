import type { AgeGroups } from './ageGroups';
import { type Covariance, inverseOf } from './covariance';
import { type GrowthCurve, meanLength } from './curve';
import { descend } from './descend';
import { type Landing, type Point, type Problem, pointAt, problemOf } from './profile';
import { type GrowthModel, SHAPES } from './shapes';
import { bestStart } from './starts';

/** Final length before any fish of the brood shows it, in mm. */
export type AsymptotePrior = { meanMm: number; sdMm: number };

export type ModelFit = { curve: GrowthCurve; residualSumOfSquares: number; aic: number; aicc: number | null };

export type FitRequest = {
  model: GrowthModel;
  groups: AgeGroups;
  originFixed?: boolean;
  prior?: AsymptotePrior | null;
  /** Where to start, instead of where the lengths say. */
  from?: Pick<GrowthCurve, 'kPerDay' | 'originDays'> | undefined;
};

/** Lengths are kept to a tenth of a millimetre: no curve knows them better than that rounding. Variance in mm^2. */
const ROUNDING = 0.1 ** 2 / 12;
const SETTLED = 1e-8;
const MOST_ROUNDS = 100;

export const unknownsOf = (originFixed: boolean): number => (originFixed ? 2 : 3);

/** Least squares for one model; null when the lengths do not determine it. Whether there are enough is checked before. */
export function fitModel({ model, groups, originFixed = false, prior = null, from }: FitRequest): ModelFit | null {
  const problem = problemOf(model, groups, originFixed);
  const freedom = groups.n - unknownsOf(originFixed);
  const start = from && pointAt(problem, from);
  const landing = prior ? settle(problem, groups, { ...prior, freedom }, start) : descendFrom(problem, start);
  if (!landing) return null;
  const curve = curveOf(problem, landing);
  const rss = residualSs(groups, curve);
  const variance = rss / freedom;
  const covariance = covarianceOf(groups, curve, { variance, prior, originFixed });
  if (!covariance) return null;
  const miss = prior ? ((curve.linfMm - prior.meanMm) / prior.sdMm) ** 2 : 0;
  return {
    curve: { ...curve, covariance, residualSdMm: Math.sqrt(variance), freedom },
    residualSumOfSquares: rss,
    ...criteria(groups, rss, miss, unknownsOf(originFixed) + 1),
  };
}

function descendFrom(problem: Problem, start: Point | undefined): Landing | null {
  const point = start ?? bestStart(problem);
  return point && descend(problem, point);
}

/**
 * A prior's weight follows from the residual variance, which follows from the fit: solved for the variance that gives
 * itself back, by secants on its logarithm.
 */
function settle(problem: Problem, groups: AgeGroups, prior: Settling, start: Point | undefined): Landing | null {
  const length = prior.meanMm / groups.longestMm;
  const repeats = groups.n - groups.ages.length;
  let variance = Math.max(ROUNDING, repeats > 0 ? groups.withinSs / repeats : (groups.longestMm / 20) ** 2);
  let landing: Landing | null = null;
  let last: { at: number; off: number } | null = null;
  for (let i = 0; i < MOST_ROUNDS; i += 1) {
    problem.prior = { length, weight: variance / prior.sdMm ** 2 };
    landing = descendFrom(problem, landing ?? start);
    if (!landing) return null;
    const next = Math.max(ROUNDING, residualSs(groups, curveOf(problem, landing)) / prior.freedom);
    const here = { at: Math.log(variance), off: Math.log(next / variance) };
    if (Math.abs(here.off) <= SETTLED) return landing;
    variance = Math.exp(here.at + secantStep(here, last));
    last = here;
  }
  return landing;
}

type Settling = AsymptotePrior & { freedom: number };

/** Where `off` would be zero, on the line through two points; without a second one, or with a wild one, a plain repetition. */
function secantStep(here: { at: number; off: number }, last: { at: number; off: number } | null): number {
  const slope = last && here.at !== last.at ? (here.off - last.off) / (here.at - last.at) : -1;
  return slope < -0.1 && slope > -10 ? -here.off / slope : here.off;
}

/** From the search's terms back to mm and days; the spread of the parameters is filled in later. */
function curveOf({ model, longestMm, middleAge, spanDays }: Problem, { logK, beta, linf }: Landing): GrowthCurve {
  const kPerDay = Math.exp(logK) / spanDays;
  return {
    model,
    linfMm: linf * longestMm,
    kPerDay,
    originDays: middleAge + beta / kPerDay,
    covariance: [
      [0, 0, 0],
      [0, 0, 0],
      [0, 0, 0],
    ],
    residualSdMm: 0,
    typicalMm: null,
    freedom: 1,
  };
}

function residualSs({ ages, means, weights, withinSs }: AgeGroups, curve: GrowthCurve): number {
  return ages.reduce(
    (sum, age, i) => sum + (weights[i] ?? 0) * ((means[i] ?? 0) - meanLength(curve, age)) ** 2,
    withinSs,
  );
}

/** Residual variance times the inverse of J'J, with the prior as one more observation of the final length. */
function covarianceOf(
  { ages, weights }: AgeGroups,
  { model, linfMm, kPerDay, originDays }: GrowthCurve,
  given: { variance: number; prior: AsymptotePrior | null; originFixed: boolean },
): Covariance | null {
  const variance = given.prior ? Math.max(ROUNDING, given.variance) : given.variance;
  const shape = SHAPES[model];
  let [m00, m01, m02, m11, m12, m22] = [0, 0, 0, 0, 0, 0];
  for (let i = 0; i < ages.length; i += 1) {
    const days = (ages[i] ?? 0) - originDays;
    const w = weights[i] ?? 0;
    const g = shape.g(-kPerDay * days);
    const slope = linfMm * shape.slope(-kPerDay * days, g);
    const [toK, toOrigin] = [-slope * days, slope * kPerDay];
    m00 += w * g * g;
    m01 += w * g * toK;
    m02 += w * g * toOrigin;
    m11 += w * toK * toK;
    m12 += w * toK * toOrigin;
    m22 += w * toOrigin * toOrigin;
  }
  if (given.prior) m00 += variance / given.prior.sdMm ** 2;
  const inverse = inverseOf(
    [
      [m00, m01, m02],
      [m01, m11, m12],
      [m02, m12, m22],
    ],
    !given.originFixed,
  );
  const scaled = (x: number) => x * variance;
  return (
    inverse && [
      [scaled(inverse[0][0]), scaled(inverse[0][1]), scaled(inverse[0][2])],
      [scaled(inverse[1][0]), scaled(inverse[1][1]), scaled(inverse[1][2])],
      [scaled(inverse[2][0]), scaled(inverse[2][1]), scaled(inverse[2][2])],
    ]
  );
}

/**
 * AIC and AICc with the residual variance counted among the `k` unknowns (Burnham & Anderson 2002, 2.4); `miss`, the
 * prior's share, in standard deviations squared. AICc is null when there are too few fish for it.
 */
function criteria({ n, longestMm, logWeights }: AgeGroups, rss: number, miss: number, k: number) {
  // A perfect fit would have a likelihood without bound.
  const variance = Math.max(rss / n, (1e-9 * longestMm) ** 2);
  const aic = n * (Math.log(2 * Math.PI * variance) + 1) - logWeights + miss + 2 * k;
  return { aic, aicc: n > k + 1 ? aic + (2 * k * (k + 1)) / (n - k - 1) : null };
}
