import { type AgeGroups, middleOf, weighed } from './ageGroups';
import type { Curves } from './bands';
import { CannotFit } from './cannotFit';
import { meanLength } from './curve';
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

/** Fits every model, with the prior while the brood is juvenile. Throws `CannotFit` when the lengths determine none. */
function fitCandidates(request: Request): Candidates {
  const { prior } = request;
  const alone = fitAll({ ...request, prior: null });
  const withPrior = prior && isJuvenile(alone, prior, request.groups) ? fitAll(request) : null;
  const used = withPrior && withPrior.fits.length > 0 ? withPrior : alone;
  if (used.fits.length === 0) throw whyNot(request);
  return used;
}

/**
 * The same for lengths that spread in proportion to their mean, as those of a brood do: each fish weighs by the inverse
 * square of the length that a first fit expects of it.
 */
function fitWeighed(request: Request): Candidates {
  let { groups } = request;
  const typicalMm = groups.means.reduce((sum, mean, i) => sum + mean * (groups.weights[i] ?? 0), 0) / groups.n;
  const least = Math.min(...groups.means) / 2;
  let found = fitCandidates(request);
  for (let round = 0; round < 2; round += 1) {
    const curves = curvesOf(found);
    const expected = (age: number) =>
      curves.reduce((sum, { curve, weight }) => sum + weight * meanLength(curve, age), 0);
    groups = weighed(request.groups, typicalMm, (age) => Math.max(least, expected(age)));
    found = fitCandidates({ ...request, groups });
  }
  const fits = found.fits.map((fit) => ({ ...fit, curve: { ...fit.curve, typicalMm } }));
  return { ...found, fits };
}

/**
 * How fish of one age spread: alike at every size, in proportion to their mean (a constant CV), or as the lengths say.
 */
export type Spread = 'constant' | 'proportional' | 'asMeasured';

/** The fits for a spread; `asMeasured` takes the likelier of the two by the same criterion as the models. */
export function fitWith(spread: Spread, request: Request): Candidates {
  if (spread === 'constant') return fitCandidates(request);
  const weighed = fitWeighed(request);
  if (spread === 'proportional') return weighed;
  const plain = fitCandidates(request);
  return (plain.fits[0]?.aic ?? 0) < (weighed.fits[0]?.aic ?? 0) ? plain : weighed;
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

function fitAll(request: Request): Candidates {
  const { models, groups, prior } = request;
  const tried = models
    .filter((model) => shortage(request, model) === null)
    .map((model) => fitModel({ model, groups, prior, originFixed: isFixed(request, model) }));
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

/** By the species' length or by the brood's own curves, any of those that count. */
function isJuvenile(alone: Candidates, prior: AsymptotePrior, { means }: AgeGroups): boolean {
  const now = means.at(-1) ?? 0;
  if (alone.fits.length === 0 || alone.ranAway || now < JUVENILE_BELOW * prior.meanMm) return true;
  return curvesOf(alone).some(({ curve: { linfMm, covariance } }) => {
    return now < JUVENILE_BELOW * linfMm || Math.sqrt(covariance[0][0]) > BROOD_KNOWS * prior.sdMm;
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
