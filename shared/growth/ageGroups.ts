import { finite } from '../badValue';

/** Age in days since the spawn, length in mm. */
export type LengthAtAge = { ageDays: number; lengthMm: number };

/**
 * Samples with the fish of one age drawn together: a curve sees only their mean, and their scatter about it,
 * `withinSs`, is the same for every curve. A brood measured on twelve days is twelve points, however many fish.
 */
export type AgeGroups = {
  n: number;
  ages: Float64Array;
  means: Float64Array;
  /** What each age weighs in the sum of squares: its fish, or less than that where their lengths spread wider. */
  weights: Float64Array;
  /** Sum of squares about the mean of each age. */
  scatter: Float64Array;
  withinSs: number;
  longestMm: number;
  /** Sum over all fish of the logarithm of their own weight: part of the likelihood. */
  logWeights: number;
};

/** Draws samples together by age, youngest first. Throws `BadValue` naming the sample whose age or length cannot be. */
export function groupByAge(samples: LengthAtAge[]): AgeGroups {
  const byAge = new Map<number, number[]>();
  samples.forEach(({ ageDays, lengthMm }, i) => {
    if (!(ageDays >= 0 && ageDays < 1e5)) finite(`Age of sample ${i + 1}`, ageDays, { min: 0, max: 1e5 });
    if (!(lengthMm > 0 && lengthMm < 1e5)) finite(`Length of sample ${i + 1}`, lengthMm, { above: 0, max: 1e5 });
    const there = byAge.get(ageDays);
    if (there) there.push(lengthMm);
    else byAge.set(ageDays, [lengthMm]);
  });
  const ages = Float64Array.from(byAge.keys()).sort();
  const groups = Array.from(ages, (age) => meanAndScatter(byAge.get(age) ?? []));
  return {
    n: samples.length,
    ages,
    means: Float64Array.from(groups, ({ mean }) => mean),
    weights: Float64Array.from(groups, ({ count }) => count),
    scatter: Float64Array.from(groups, ({ scatter }) => scatter),
    withinSs: groups.reduce((sum, { scatter }) => sum + scatter, 0),
    longestMm: groups.reduce((longest, { most }) => Math.max(longest, most), 0),
    logWeights: 0,
  };
}

/** Middle of the ages by weight. */
export const middleOf = ({ ages, weights }: Pick<AgeGroups, 'ages' | 'weights'>): number =>
  ages.reduce((sum, age, i) => sum + age * (weights[i] ?? 0), 0) / weights.reduce((sum, weight) => sum + weight, 0);

/**
 * The groups weighed for lengths that spread in proportion to the mean (a constant CV): a fish counts by the inverse
 * square of the length expected of it, against one of `typicalMm`, at which the residual's standard deviation is then
 * said.
 */
export function weighed(groups: AgeGroups, typicalMm: number, expectedMm: (ageDays: number) => number): AgeGroups {
  const share = groups.ages.map((age) => (typicalMm / expectedMm(age)) ** 2);
  const sum = (of: (i: number) => number) => groups.ages.reduce((total, _, i) => total + of(i), 0);
  const shareOf = (i: number) => share[i] ?? 0;
  return {
    ...groups,
    weights: groups.weights.map((count, i) => count * shareOf(i)),
    withinSs: sum((i) => shareOf(i) * (groups.scatter[i] ?? 0)),
    logWeights: sum((i) => (groups.weights[i] ?? 0) * Math.log(shareOf(i))),
  };
}

function meanAndScatter(lengths: number[]) {
  if (lengths.length === 1) return { count: 1, mean: lengths[0] ?? 0, scatter: 0, most: lengths[0] ?? 0 };
  // Sorted, so that the order of the fish changes no digit.
  lengths.sort((a, b) => a - b);
  const mean = lengths.reduce((sum, y) => sum + y, 0) / lengths.length;
  const scatter = lengths.reduce((sum, y) => sum + (y - mean) ** 2, 0);
  return { count: lengths.length, mean, scatter, most: lengths.at(-1) ?? 0 };
}
