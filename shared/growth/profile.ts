import { type AgeGroups, middleOf } from './ageGroups';
import { type GrowthModel, SHAPES } from './shapes';

/**
 * Fitting with the final length profiled out (variable projection: Golub & Pereyra 1973; Kaufman 1975): for a given
 * shape the best final length is a division, so the search is over log K and beta = K origin alone. Everything is
 * scaled: ages to a span of one about their mean, lengths to the longest fish.
 */
export type Problem = {
  model: GrowthModel;
  /** Von Bertalanffy's origin is the spawn, age 0, and is not searched. */
  originFixed: boolean;
  tau: Float64Array;
  y: Float64Array;
  weights: Float64Array;
  middleAge: number;
  spanDays: number;
  longestMm: number;
  /** What the species says of the final length, as one more observation: scaled length, and weight against one fish. */
  prior: { length: number; weight: number } | null;
  /** Room for the shape, its slope and its bend at each age, written anew at every point. */
  g: Float64Array;
  slope: Float64Array;
  bend: Float64Array;
};

/** A point of the search: log of K (per span), and u at the middle age. */
export type Point = { logK: number; beta: number };

/** The problem at a point: final length, sum of squares with the prior's share, and what the next step needs. */
export type Landing = Point & { linf: number; cost: number } & Slopes;
/** Half the downhill gradient, half the curvature, and the curvature's Gauss-Newton part, which is never negative. */
export type Slopes = { down: { k: number; beta: number }; exact: Curvature; gauss: Curvature };
export type Curvature = { kk: number; kb: number; bb: number };

/** Slower than this over the ages measured is a straight line, faster is over between two of them. */
const [SLOWEST, FASTEST] = [Math.log(1e-3), Math.log(1e3)];
export function problemOf(model: GrowthModel, groups: AgeGroups, originFixed = false): Problem {
  const { ages, means, weights, longestMm } = groups;
  const last = ages.at(-1) ?? 0;
  const spanDays = (originFixed ? last : last - (ages[0] ?? 0)) || 1;
  const middleAge = originFixed ? 0 : middleOf(groups);
  return {
    model,
    originFixed,
    tau: ages.map((age) => (age - middleAge) / spanDays),
    y: means.map((mean) => mean / longestMm),
    weights,
    middleAge,
    spanDays,
    longestMm,
    prior: null,
    g: new Float64Array(ages.length),
    slope: new Float64Array(ages.length),
    bend: new Float64Array(ages.length),
  };
}

/** Where a curve with this K a day and origin lies in a problem's own terms. */
export function pointAt(problem: Problem, { kPerDay, originDays }: { kPerDay: number; originDays: number }): Point {
  const { originFixed, spanDays, middleAge } = problem;
  return { logK: Math.log(kPerDay * spanDays), beta: originFixed ? 0 : kPerDay * (originDays - middleAge) };
}

/** The problem at a point, or null where the point lies beyond what lengths can tell. */
export function landAt(problem: Problem, { logK, beta }: Point): Landing | null {
  if (!(logK >= SLOWEST && logK <= FASTEST)) return null;
  const { tau, y, weights, prior, g, slope, bend } = problem;
  const shape = SHAPES[problem.model];
  const k = Math.exp(logK);
  let gg = prior ? prior.weight : 0;
  let gy = prior ? prior.weight * prior.length : 0;
  let alongK = 0;
  let alongBeta = 0;
  for (let i = 0; i < tau.length; i += 1) {
    const kt = k * (tau[i] ?? 0);
    const value = shape.g(beta - kt);
    const s = shape.slope(beta - kt, value);
    const weighted = (weights[i] ?? 0) * value;
    g[i] = value;
    slope[i] = s;
    bend[i] = shape.bend(beta - kt, value, s);
    gg += weighted * value;
    gy += weighted * (y[i] ?? 0);
    alongK -= weighted * s * kt;
    alongBeta += weighted * s;
  }
  const linf = gy / gg;
  if (!(linf > 0 && linf < Number.POSITIVE_INFINITY)) return null;
  return { logK, beta, linf, ...slopesAt(problem, { k, linf, gg, alongK: alongK / gg, alongBeta: alongBeta / gg }) };
}

type Sides = { k: number; linf: number; gg: number; alongK: number; alongBeta: number };

/**
 * Gradient and curvature in log K and beta with the final length taken up: the shape's derivatives less their part along
 * g, and for the exact curvature the residuals times the second derivatives (Schur's complement of the full Hessian).
 */
function slopesAt(problem: Problem, sides: Sides): Slopes & { cost: number } {
  const { tau, y, weights, prior, g, slope, bend } = problem;
  const { k, linf, gg, alongK, alongBeta } = sides;
  const weight = prior ? prior.weight : 0;
  let cost = prior ? weight * (prior.length - linf) ** 2 : 0;
  let [pKK, pKB, pBB] = [weight * alongK * alongK, weight * alongK * alongBeta, weight * alongBeta * alongBeta];
  let [rK, rB, rKK, rKB, rBB] = [0, 0, 0, 0, 0];
  for (let i = 0; i < tau.length; i += 1) {
    const w = weights[i] ?? 0;
    const value = g[i] ?? 0;
    const dB = slope[i] ?? 0;
    const by = -k * (tau[i] ?? 0);
    const r = w * ((y[i] ?? 0) - linf * value);
    const pK = dB * by - value * alongK;
    const pB = dB - value * alongBeta;
    const bent = r * (bend[i] ?? 0);
    cost += r * ((y[i] ?? 0) - linf * value);
    pKK += w * pK * pK;
    pKB += w * pK * pB;
    pBB += w * pB * pB;
    rK += r * dB * by;
    rB += r * dB;
    rKK += (bent * by + r * dB) * by;
    rKB += bent * by;
    rBB += bent;
  }
  const gauss = { kk: linf * linf * pKK, kb: linf * linf * pKB, bb: linf * linf * pBB };
  const exact = {
    kk: gauss.kk + 2 * linf * alongK * rK - (rK * rK) / gg - linf * rKK,
    kb: gauss.kb + linf * (alongK * rB + alongBeta * rK) - (rK * rB) / gg - linf * rKB,
    bb: gauss.bb + 2 * linf * alongBeta * rB - (rB * rB) / gg - linf * rBB,
  };
  return { cost, down: { k: linf * rK, beta: linf * rB }, exact, gauss };
}
