/** The three curves. All are Linf times a shape of u = K (t - m), so one Jacobian in closed form serves all. */
export type GrowthModel = 'vonBertalanffy' | 'gompertz' | 'logistic';
export const GROWTH_MODELS: readonly GrowthModel[] = ['vonBertalanffy', 'gompertz', 'logistic'];

export type Shape = {
  /** Length as a share of Linf. */
  at(u: number): number;
  /** Its derivative by u, given u and the share there. */
  slope(u: number, share: number): number;
  /** The u at which the share is reached; the share is between 0 and 1. */
  inverse(share: number): number;
};

/**
 * von Bertalanffy 1938: 1 - exp(-u), m is t0. Gompertz 1825: exp(-exp(-u)), m is the age of fastest growth. Logistic
 * (Verhulst 1838): 1 / (1 + exp(-u)), m likewise.
 */
export const SHAPES: Record<GrowthModel, Shape> = {
  vonBertalanffy: {
    at: (u) => -Math.expm1(-u),
    slope: (u) => Math.exp(-u),
    inverse: (share) => -Math.log1p(-share),
  },
  gompertz: {
    at: (u) => Math.exp(-Math.exp(-u)),
    slope: (u, share) => share * Math.exp(-u),
    inverse: (share) => -Math.log(-Math.log(share)),
  },
  logistic: {
    at: (u) => 1 / (1 + Math.exp(-u)),
    slope: (_u, share) => share * (1 - share),
    inverse: (share) => Math.log(share / (1 - share)),
  },
};
