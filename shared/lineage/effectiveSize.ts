import { BadValue, finite, whole } from '../badValue';

/**
 * Effective population size (number of fish) of a breeding group: 4 Nm Nf / (Nm + Nf) (Wright 1931). Count the breeders that
 * left young, not all in the tank. With shares of parentage (any scale, by sex) each sex counts as 1 / sum of squared shares,
 * so that a male who sires nearly all counts for himself alone. 0 when a sex is missing. Throws a `BadValue` for counts that are not
 * whole from 0 on and for shares below zero or not numbers.
 */
export function effectiveSize(
  sex: { males: number; females: number } | { maleShares: number[]; femaleShares: number[] },
): number {
  const [males, females] =
    'males' in sex
      ? [whole('males', sex.males), whole('females', sex.females)]
      : [
          effectiveBreeders('share of a male', sex.maleShares),
          effectiveBreeders('share of a female', sex.femaleShares),
        ];
  return males > 0 && females > 0 ? (4 * males * females) / (males + females) : 0;
}

function effectiveBreeders(what: string, shares: number[]): number {
  const largest = shares.reduce((most, share) => Math.max(most, finite(what, share, { min: 0 })), 0);
  if (largest === 0) return 0;
  // Against the largest share, so that neither the sum nor the squares overflow.
  const scaled = shares.map((share) => share / largest);
  const sum = scaled.reduce((total, share) => total + share, 0);
  return sum ** 2 / scaled.reduce((total, share) => total + share ** 2, 0);
}

/**
 * Effective size of `breeders` (both sexes) from the variance of how many young they left that bred in turn:
 * 8 N / (Vm + Vf + 4), for a stable population with two such young each and equal sexes (Hill 1979, from memory).
 * With another mean number of young k: (N k - 1) / (k - 1 + V / k), V the mean of the two variances (Crow & Kimura 1970,
 * from memory); `null` when that has no answer (no young, or fewer than one parent's worth).
 */
export function effectiveSizeFromFamilies(families: {
  breeders: number;
  maleVariance: number;
  femaleVariance: number;
  meanYoung?: number;
}): number | null {
  const breeders = whole('breeders', families.breeders);
  const maleVariance = finite('variance among males', families.maleVariance, { min: 0 });
  const femaleVariance = finite('variance among females', families.femaleVariance, { min: 0 });
  const meanYoung = finite('mean number of young', families.meanYoung ?? 2, { min: 0 });
  if (meanYoung === 2) return (8 * breeders) / (maleVariance + femaleVariance + 4);
  if (meanYoung === 0) return null;
  const numerator = breeders * meanYoung - 1;
  const denominator = meanYoung - 1 + (maleVariance + femaleVariance) / (2 * meanYoung);
  return numerator > 0 && denominator > 0 ? numerator / denominator : null;
}

/**
 * Effective size over several generations: the harmonic mean of theirs (Wright 1938), so the smallest decides. 0 as soon as
 * one of them is 0. Throws a `BadValue` for an empty list and for sizes below zero or not numbers.
 */
export function harmonicEffectiveSize(sizes: number[]): number {
  if (sizes.length === 0) throw new BadValue('effective sizes', '', 'at least one generation is needed');
  const inverses = sizes.map((size) => 1 / finite('effective size', size, { min: 0 }));
  const sum = inverses.reduce((total, inverse) => total + inverse, 0);
  return Number.isFinite(sum) ? sizes.length / sum : 0;
}
