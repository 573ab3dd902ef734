import { type AgeGroups, middleOf, weighed } from './ageGroups';
import { type Curves, meanOf } from './bands';
import { CannotFit } from './cannotFit';
import { type AsymptotePrior, fitModel, type ModelFit, unknownsOf } from './fitModel';
import type { GrowthModel } from './shapes';

/** Until it has three quarters of its final length, a brood does not show where growth ends. */
const JUVENILE_BELOW = 0.75;
/**
 * From here on the brood knows its final length so much better than the species does that the prior says nothing more.
 */
const BROOD_KNOWS = 1 / 3;
/** A curve that counts for less than this has no say. */
const COUNTS_FROM = 0.01;

export type Request = {
  models: GrowthModel[];
  groups: AgeGroups;
  prior: AsymptotePrior | null;
  /** Von Bertalanffy's alone. */
  originFixed: boolean;
};

/** Best first, with Akaike weights; `ranAway` when another model fits best as a straight line or a jump. */
export type Candidates = { fits: ModelFit[]; weights: number[]; usedPrior: boolean; ranAway: boolean };

/** How fish of one age spread: alike at every size, in proportion to their mean (a constant CV), or as the lengths say. */
export type Spread = 'constant' | 'proportional' | 'asMeasured';

/**
 * Fits every model, with the prior while the brood is juvenile. Of the two spreads `asMeasured` takes the likelier, by the
 * same criterion as the models. Throws `CannotFit` when the lengths determine none.
 */
export function fitCandidates(spread: Spread, request: Request): Candidates {
  const plain = fitPlain(request);
  const proportional = spread === 'constant' ? null : fitProportional(request, plain);
  if (!proportional) return plain;
  return spread === 'asMeasured' && aicOf(plain) < aicOf(proportional) ? plain : proportional;
}

const aicOf = ({ fits }: Candidates) => fits[0]?.aic ?? 0;

function fitPlain(request: Request): Candidates {
  const { prior, groups } = request;
  const small = prior !== null && lastMean(groups) < JUVENILE_BELOW * prior.meanMm;
  const alone = small ? null : fitAll({ ...request, prior: null });
  const juvenile = prior !== null && (alone === null || isJuvenile(alone, prior, groups));
  const withPrior = juvenile ? fitAll(request) : null;
  const used = withPrior && withPrior.fits.length > 0 ? withPrior : alone;
  if (!used || used.fits.length === 0) throw whyNot(request);
  return used;
}

const lastMean = ({ means }: AgeGroups) => means.at(-1) ?? 0;

/** Each fish weighs by the inverse square of the length that the plain fit expects of it. */
function fitProportional(request: Request, plain: Candidates): Candidates | null {
  const { groups } = request;
  const typicalMm = groups.means.reduce((sum, mean, i) => sum + mean * (groups.weights[i] ?? 0), 0) / groups.n;
  const least = Math.min(...groups.means) / 2;
  const prior = plain.usedPrior ? request.prior : null;
  const curves = curvesOf(plain);
  const expected = (age: number) => Math.max(least, meanOf(curves, age));
  const found = fitAll({ ...request, prior, groups: weighed(groups, typicalMm, expected) }, plain);
  if (found.fits.length === 0) return null;
  return { ...found, fits: found.fits.map((fit) => ({ ...fit, curve: { ...fit.curve, typicalMm } })) };
}

/** The curves that count, their weights adding up to one. */
export function curvesOf({ fits, weights }: Candidates): Curves {
  const counting = fits
    .map(({ curve }, i) => ({ curve, weight: weights[i] ?? 0 }))
    .filter(({ weight }) => weight >= COUNTS_FROM);
  const total = counting.reduce((sum, { weight }) => sum + weight, 0);
  return counting.map(({ curve, weight }) => ({ curve, weight: weight / total }));
}

const isFixed = ({ originFixed }: Request, model: GrowthModel) => originFixed && model === 'vonBertalanffy';

/** All that can be fitted, starting from curves found before where there are any. */
function fitAll(request: Request, from?: Candidates): Candidates {
  const { models, groups, prior } = request;
  const known = (model: GrowthModel) => from?.fits.find(({ curve }) => curve.model === model)?.curve;
  const tried = models
    .filter((model) => shortage(request, model) === null)
    .map((model) => fitModel({ model, groups, prior, originFixed: isFixed(request, model), from: known(model) }));
  const fits = tried.filter((fit) => fit !== null);
  // By AICc where every model has one, else by AIC: the numbers of unknowns are nearly the same.
  const of = fits.every(({ aicc }) => aicc !== null)
    ? (fit: ModelFit) => fit.aicc ?? fit.aic
    : ({ aic }: ModelFit) => aic;
  fits.sort((p, q) => of(p) - of(q) || p.residualSumOfSquares - q.residualSumOfSquares);
  return { fits, weights: akaikeWeights(fits.map(of)), usedPrior: prior !== null, ranAway: fits.length < tried.length };
}

/** exp(-difference / 2), to sum one (Burnham & Anderson 2002, 2.9). */
export function akaikeWeights(criteria: number[]): number[] {
  const least = Math.min(...criteria);
  const shares = criteria.map((criterion) => Math.exp((least - criterion) / 2));
  const total = shares.reduce((sum, share) => sum + share, 0);
  return shares.map((share) => share / total);
}

/** What there is too little of: a fish more than unknowns, and as many ages, of which the prior stands for one. */
function shortage(request: Request, model: GrowthModel): CannotFit | null {
  const { groups, prior } = request;
  const needed = unknownsOf(isFixed(request, model)) + 1;
  if (groups.n < needed) return new CannotFit('tooFewFish', { needed, there: groups.n });
  const [agesNeeded, there] = [prior ? needed - 1 : needed, groups.ages.length];
  return there < agesNeeded ? new CannotFit('tooFewAges', { needed: agesNeeded, there }) : null;
}

/** Whether the brood's own curves, any of those that count, leave open where growth ends. */
function isJuvenile(alone: Candidates, prior: AsymptotePrior, groups: AgeGroups): boolean {
  if (alone.fits.length === 0 || alone.ranAway) return true;
  return curvesOf(alone).some(({ curve: { linfMm, covariance } }) => {
    return lastMean(groups) < JUVENILE_BELOW * linfMm || Math.sqrt(covariance[0][0]) > BROOD_KNOWS * prior.sdMm;
  });
}

function whyNot(request: Request): CannotFit {
  const short = request.models.map((model) => shortage(request, model));
  const first = short[0];
  if (first && short.every((why) => why !== null)) return first;
  return new CannotFit(rises(request.groups) ? 'noCurvature' : 'noGrowth');
}

function rises(groups: AgeGroups): boolean {
  const { ages, means, weights } = groups;
  const middle = middleOf(groups);
  return ages.reduce((sum, age, i) => sum + (weights[i] ?? 0) * (age - middle) * (means[i] ?? 0), 0) > 0;
}
