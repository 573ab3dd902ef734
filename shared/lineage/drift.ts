import { finite, whole } from '../badValue';

/** The smallest effective size there is: one self-fertile animal has 1, a share of one less. */
const effective = (size: number): number => finite('effective size', size, { min: 0.5 });

/** Inbreeding gained per generation, 1 / (2 Ne) (Wright 1931); `null` for a group that cannot breed (Ne = 0). */
export function inbreedingRate(effectiveSize: number): number | null {
  return effectiveSize === 0 ? null : 1 / (2 * effective(effectiveSize));
}

/**
 * F expected after `generations` of random mating at a constant effective size: 1 - (1 - F0) (1 - 1 / 2Ne)^t (Wright 1931).
 * `null` for a group that cannot breed. Throws a `BadValue` for values out of range.
 */
export function inbreedingAfter(from: { effectiveSize: number; generations: number; f?: number }): number | null {
  const kept = shareKept(from.effectiveSize, from.generations);
  return kept === null ? null : 1 - (1 - finite('F', from.f ?? 0, { min: 0, max: 1 })) * kept;
}

/**
 * Gene diversity (0 to 1) expected after `generations` at a constant effective size, from that of today (1 for a whole wild
 * population): GD0 (1 - 1 / 2Ne)^t (Wright 1931). `null` for a group that cannot breed. Throws a `BadValue`.
 */
export function predictedGeneDiversity(from: {
  effectiveSize: number;
  generations: number;
  geneDiversity?: number;
}): number | null {
  const kept = shareKept(from.effectiveSize, from.generations);
  return kept === null ? null : finite('gene diversity', from.geneDiversity ?? 1, { min: 0, max: 1 }) * kept;
}

function shareKept(effectiveSize: number, generations: number): number | null {
  const rate = inbreedingRate(effectiveSize);
  return rate === null ? null : (1 - rate) ** whole('generations', generations);
}

/** The constant effective size that keeps F at or below `f` for `generations`: 1 / (2 (1 - (1 - F)^(1/t))). Throws a `BadValue`. */
export function requiredEffectiveSize(goal: { f: number; generations: number }): number {
  const f = finite('F', goal.f, { above: 0, max: 1 });
  const generations = whole('generations', goal.generations, 1);
  return 1 / (2 * -Math.expm1(Math.log1p(-f) / generations));
}

/** Chance that founders of this effective size carry an allele of that frequency: 1 - (1 - p)^(2 Ne). Throws a `BadValue`. */
export function chanceAlleleKept(of: { frequency: number; effectiveSize: number }): number {
  const frequency = finite('frequency', of.frequency, { min: 0, max: 1 });
  return 1 - (1 - frequency) ** (2 * finite('effective size', of.effectiveSize, { min: 0 }));
}

/** Founders needed to carry an allele of that frequency with that chance: ln(1 - P) / (2 ln(1 - p)). Throws a `BadValue`. */
export function foundersForAllele(goal: { frequency: number; chance: number }): { exact: number; whole: number } {
  const frequency = finite('frequency', goal.frequency, { above: 0, max: 0.999_999 });
  const chance = finite('chance', goal.chance, { min: 0, max: 0.999_999 });
  const exact = Math.log1p(-chance) / (2 * Math.log1p(-frequency));
  // A rounding error above a whole number must not ask for one founder more.
  return { exact, whole: Math.ceil(exact - 1e-9) };
}
