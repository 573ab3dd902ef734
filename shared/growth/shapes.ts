export type GrowthModel = 'vonBertalanffy' | 'gompertz' | 'logistic';
export const GROWTH_MODELS = ['vonBertalanffy', 'gompertz', 'logistic'] as const;

/**
 * Each model is the final length times a shape g(u) of u = -K (age - origin), so the three differ in g alone.
 * `straight` turns a share of the final length y into something linear in e^u, from which starting values are
 * regressed.
 */
type Shape = {
  g(u: number): number;
  /** g'(u), from u and g(u). */
  slope(u: number, g: number): number;
  /** g''(u), from u, g(u) and g'(u). */
  bend(u: number, g: number, slope: number): number;
  /** u of a share of the final length between 0 and 1. */
  inverse(share: number): number;
  straight: Straight;
};

type Straight = {
  of(y: number): number;
  /** Weight that keeps the transformed lengths as precise as the lengths were. */
  weight(y: number): number;
  /** e^(K origin) and the final length from intercept and slope against e^(-K age). */
  origin(intercept: number, slope: number): number;
};

/** Keeps e^u and products with it finite, however absurd the age. */
const MOST = 300;
const exp = (u: number) => Math.exp(Math.min(u, MOST));

const vonBertalanffy: Shape = {
  g: (u) => 1 - exp(u),
  slope: (u) => -exp(u),
  bend: (_u, _g, slope) => slope,
  inverse: (share) => Math.log1p(-share),
  straight: { of: (y) => y, weight: () => 1, origin: (intercept, slope) => -slope / intercept },
};

const gompertz: Shape = {
  g: (u) => Math.exp(-exp(u)),
  slope: (u, g) => -exp(u) * g,
  bend: (u, _, slope) => slope * (1 - exp(u)),
  inverse: (share) => Math.log(-Math.log(share)),
  straight: { of: Math.log, weight: (y) => y * y, origin: (_, slope) => -slope },
};

const logistic: Shape = {
  g: (u) => 1 / (1 + exp(u)),
  slope: (_, g) => -g * (1 - g),
  bend: (_, g, slope) => -slope * (1 - 2 * g),
  inverse: (share) => Math.log(1 / share - 1),
  straight: { of: (y) => 1 / y, weight: (y) => y ** 4, origin: (intercept, slope) => slope / intercept },
};

export const SHAPES: Record<GrowthModel, Shape> = { vonBertalanffy, gompertz, logistic };
