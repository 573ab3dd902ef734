import { finite, whole } from '../badValue';
import { normalQuantile, normalShareBelow } from './normal';
import { logGamma } from './studentT';

/**
 * The share of a batch at or over a length, 0 to 1, its lengths being normal about `meanMm` with `cv` = sd / mean as a
 * fraction. Throws `BadValue` for a mean or length that is not above zero, or a cv below zero.
 */
export function shareAtLeast(lengthMm: number, at: { meanMm: number; cv: number }): number {
  finite('Length', lengthMm, { min: 0 });
  const meanMm = finite('Mean length', at.meanMm, { above: 0 });
  const cv = finite('CV', at.cv, { min: 0 });
  if (cv === 0) return meanMm >= lengthMm ? 1 : 0;
  return normalShareBelow((meanMm - lengthMm) / (cv * meanMm));
}

/**
 * Mean length that a batch needs for a share of it to be at or over a length; null when it is too uneven for that at
 * all.
 */
export function meanNeeded(lengthMm: number, share: number, cv: number): number | null {
  const shortfall = 1 - normalQuantile(share) * finite('CV', cv, { min: 0 });
  return shortfall > 0 ? finite('Length', lengthMm, { above: 0 }) / shortfall : null;
}

/** How long the fish of a batch are, and how well that is known. */
export type BatchSize = { meanMm: number; seMm: number; cv: number; cvSd: number };

export type HeadsSpan = { expected: number; low: number; high: number };

/** A twentieth of a fish short of one more counts as one: of a batch long past the length, all are there. */
const NEARLY = 0.05;
const NODES = Array.from({ length: 41 }, (_, i) => (i - 20) / 5);

/**
 * How many of so many heads are at or over a length: the expected number rounded down, and the 95 % range. The range
 * holds both doubts: which fish grew (binomial) and how well mean and cv are known (normal, by the delta method).
 * Throws `BadValue`.
 */
export function headsAtLeast(size: BatchSize, lengthMm: number, heads: number): HeadsSpan {
  whole('Head count', heads);
  const { meanMm, cv } = size;
  const share = shareAtLeast(lengthMm, size);
  if (heads === 0 || cv === 0) return certain(heads * share);
  const deviate = (meanMm - lengthMm) / (cv * meanMm);
  const doubt = Math.hypot((lengthMm / (cv * meanMm ** 2)) * size.seMm, (deviate / cv) * size.cvSd);
  const chances = new Float64Array(heads + 1);
  const logWays = chances.map((_, k) => logGamma(heads + 1) - logGamma(k + 1) - logGamma(heads - k + 1));
  let total = 0;
  let expected = 0;
  for (const node of NODES) {
    const weight = Math.exp((-node * node) / 2);
    const p = normalShareBelow(deviate + doubt * node);
    total += weight;
    expected += weight * heads * p;
    addBinomial(chances, logWays, { p, weight });
  }
  return {
    expected: Math.floor(expected / total + NEARLY),
    low: quantile(chances, 0.025 * total),
    high: quantile(chances, 0.975 * total),
  };
}

const certain = (heads: number): HeadsSpan => ({ expected: heads, low: heads, high: heads });

function addBinomial(chances: Float64Array, logWays: Float64Array, { p, weight }: { p: number; weight: number }): void {
  const n = chances.length - 1;
  // Kept off the ends, where a logarithm has no value: the share lost is far below a fish.
  const [logP, logQ] = [Math.log(Math.max(p, 1e-300)), Math.log(Math.max(1 - p, 1e-300))];
  for (let k = 0; k <= n; k += 1) {
    chances[k] = (chances[k] ?? 0) + weight * Math.exp((logWays[k] ?? 0) + k * logP + (n - k) * logQ);
  }
}

/** The smallest number of heads whose chance, with all smaller ones, reaches `upTo`. */
function quantile(chances: Float64Array, upTo: number): number {
  let sum = 0;
  return Math.max(
    0,
    chances.findIndex((chance) => {
      sum += chance;
      return sum >= upTo - 1e-12;
    }),
  );
}
