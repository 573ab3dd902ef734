import { BadValue, finite } from '../badValue';
import { groupByAge, type LengthAtAge } from './ageGroups';
import { ageSpanAt, type Curves, type LengthSpan, lengthOn } from './bands';
import { type Candidates, curvesOf, fitCandidates, type Spread } from './candidates';
import type { GrowthCurve } from './curve';
import type { AsymptotePrior } from './fitModel';
import { GROWTH_MODELS, type GrowthModel } from './shapes';

const DAYS_PER_YEAR = 365.25;

/** When a final length is no more than an extrapolation: so far above the longest fish, or so uncertain. */
const FAR_ABOVE = 3;
const UNCERTAIN = 0.5;

export type GrowthOptions = {
  models?: GrowthModel[];
  asymptotePrior?: AsymptotePrior;
  /** Length zero at the spawn, so that von Bertalanffy has two unknowns: for few ages. */
  vonBertalanffyOriginFixed?: boolean;
  /** Left out: constant, as in ordinary least squares. */
  spread?: Spread;
};

export type GrowthFit = {
  model: GrowthModel;
  /** `linfMm`, `kPerYear`, and `t0Days` for von Bertalanffy, else `tiDays`. A year is 365.25 days. */
  parameters: Record<string, number>;
  standardErrors: Record<string, number>;
  residualSdMm: number;
  residualSumOfSquares: number;
  n: number;
  /** Null with fewer than two fish more than unknowns, the residual's included; then models compare by AIC. */
  aicc: number | null;
  candidates: { model: GrowthModel; aicc: number | null; weight: number }[];
  usedPrior: boolean;
  ages: { fromDays: number; toDays: number; distinct: number };
  /**
   * The final length lies far above the longest fish, is very uncertain, or another curve saw no end to growth at all.
   */
  extrapolated: boolean;
  /** The chosen curve, and all that count with their weights, as plain data for `bands.ts`. */
  curve: GrowthCurve;
  curves: Curves;
  lengthAt(ageDays: number, level?: number): LengthSpan;
  ageAt(lengthMm: number, level?: number): { mean: number; low: number; high: number } | null;
};

/**
 * Fits growth curves to individual lengths (mm) at ages (days since the spawn) by least squares and chooses by AICc:
 * von Bertalanffy L = Linf (1 - exp(-K (t - t0))), Gompertz Linf exp(-exp(-K (t - ti))), logistic Linf / (1 + exp(-K (t
 * - ti))). Standard errors and bands: residual variance RSS / (n - p) and the delta method, Student's t (Seber & Wild
 * 1989, Nonlinear Regression); AICc counts the residual variance (Burnham & Anderson 2002); checked against NIST's
 * reference sets and R's nls.
 *
 * `asymptotePrior`, the species' adult size, joins the likelihood as a normal penalty on Linf while the fish are
 * juvenile: no curve without it, a mean under three quarters of the prior's or of the fitted Linf, or a standard error
 * of Linf over a third of the prior's. Then `usedPrior` is true. `ageAt` is null when the mean never gets there or, at
 * `level`, perhaps never does.
 *
 * The order of samples does not matter. Fish measured again and again are not independent: the bands are then too
 * narrow. Throws `BadValue` for an age or length that cannot be, `CannotFit` when the lengths do not determine any of
 * the curves.
 */
export function fitGrowth(samples: LengthAtAge[], options: GrowthOptions = {}): GrowthFit {
  const {
    models = [...GROWTH_MODELS],
    spread = 'constant',
    asymptotePrior: prior = null,
    vonBertalanffyOriginFixed = false,
  } = options;
  if (models.length === 0) throw new BadValue('Models', models, 'at least one is needed');
  if (prior) finite('Mean of the asymptote prior', prior.meanMm, { above: 0 });
  if (prior) finite('SD of the asymptote prior', prior.sdMm, { above: 0 });
  const groups = groupByAge(samples);
  const request = { models: [...new Set(models)], groups, prior, originFixed: vonBertalanffyOriginFixed };
  const found = fitCandidates(spread, request);
  const [fromDays = 0, toDays = 0] = [groups.ages[0], groups.ages.at(-1)];
  const ages = { fromDays, toDays, distinct: groups.ages.length };
  const { longestMm, n } = groups;
  return { ...fitOf(found, longestMm), n, ages };
}

function fitOf(found: Candidates, longestMm: number): Omit<GrowthFit, 'n' | 'ages'> {
  const { fits, weights, usedPrior, ranAway } = found;
  const [best] = fits;
  if (!best) throw new BadValue('Candidates', fits.length, 'at least one is needed');
  const { curve } = best;
  const [{ model, linfMm, kPerDay, originDays }, [seLinf, seK, seOrigin]] = [curve, standardErrorsOf(curve)];
  const origin = model === 'vonBertalanffy' ? 't0Days' : 'tiDays';
  const alone: Curves = [{ curve, weight: 1 }];
  return {
    model,
    parameters: { linfMm, kPerYear: kPerDay * DAYS_PER_YEAR, [origin]: originDays },
    standardErrors: { linfMm: seLinf, kPerYear: seK * DAYS_PER_YEAR, [origin]: seOrigin },
    residualSdMm: curve.residualSdMm,
    residualSumOfSquares: best.residualSumOfSquares,
    aicc: best.aicc,
    candidates: fits.map((fit, i) => ({ model: fit.curve.model, aicc: fit.aicc, weight: weights[i] ?? 0 })),
    usedPrior,
    extrapolated: ranAway || linfMm > FAR_ABOVE * longestMm || seLinf > UNCERTAIN * linfMm,
    curve,
    curves: curvesOf(found),
    lengthAt: (ageDays, level) => lengthOn(alone, ageDays, level),
    ageAt: (lengthMm, level) => boundedAge(alone, lengthMm, level),
  };
}

const standardErrorsOf = ({ covariance: [linf, k, origin] }: GrowthCurve): [number, number, number] => [
  Math.sqrt(linf[0]),
  Math.sqrt(k[1]),
  Math.sqrt(origin[2]),
];

function boundedAge(curves: Curves, lengthMm: number, level?: number) {
  const span = ageSpanAt(curves, lengthMm, level);
  return span === null || span.high === null ? null : { mean: span.mean, low: span.low, high: span.high };
}
