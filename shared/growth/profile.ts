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
  /** Room for the shape and its slope at each age, written anew at every point. */
  g: Float64Array;
  slope: Float64Array;
};

/** A point of the search: log of K (per span), and u at the middle age. */
export type Point = { logK: number; beta: number };

/** The problem at a point: final length, sum of squares with the prior's share, and the reduced normal equations. */
export type Landing = Point & { linf: number; cost: number; normal: Normal };
/** `[[aKK, aKB], [aKB, aBB]] step = [bK, bB]`. */
type Normal = { aKK: number; aKB: number; aBB: number; bK: number; bB: number };

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
  };
}

/** The problem at a point, or null where the point lies beyond what lengths can tell. */
export function landAt(problem: Problem, { logK, beta }: Point): Landing | null {
  if (!(logK >= SLOWEST && logK <= FASTEST)) return null;
  const { tau, y, weights, prior, g, slope } = problem;
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
    gg += weighted * value;
    gy += weighted * (y[i] ?? 0);
    alongK -= weighted * s * kt;
    alongBeta += weighted * s;
  }
  const linf = gy / gg;
  if (!(linf > 0 && linf < Number.POSITIVE_INFINITY)) return null;
  return { logK, beta, linf, ...normalAt(problem, { k, linf, alongK: alongK / gg, alongBeta: alongBeta / gg }) };
}

type Sides = { k: number; linf: number; alongK: number; alongBeta: number };

/** Normal equations of the shape's two parameters with their part along g, which the final length takes up, removed. */
function normalAt(problem: Problem, { k, linf, alongK, alongBeta }: Sides): { cost: number; normal: Normal } {
  const { tau, y, weights, prior, g, slope } = problem;
  const weight = prior ? prior.weight : 0;
  let cost = prior ? weight * (prior.length - linf) ** 2 : 0;
  let aKK = weight * alongK * alongK;
  let aKB = weight * alongK * alongBeta;
  let aBB = weight * alongBeta * alongBeta;
  let bK = 0;
  let bB = 0;
  for (let i = 0; i < tau.length; i += 1) {
    const w = weights[i] ?? 0;
    const value = g[i] ?? 0;
    const dB = slope[i] ?? 0;
    const dK = -dB * k * (tau[i] ?? 0);
    const r = (y[i] ?? 0) - linf * value;
    const pK = dK - value * alongK;
    const pB = dB - value * alongBeta;
    cost += w * r * r;
    aKK += w * pK * pK;
    aKB += w * pK * pB;
    aBB += w * pB * pB;
    bK += w * r * dK;
    bB += w * r * dB;
  }
  const square = linf * linf;
  return { cost, normal: { aKK: aKK * square, aKB: aKB * square, aBB: aBB * square, bK: bK * linf, bB: bB * linf } };
}
