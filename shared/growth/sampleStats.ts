import { BadValue, finite, whole } from '../badValue';
import { normalReach } from './normal';
import { studentReach } from './studentT';

/** Figures of one sample, in the unit of its values. One fish has no spread, so what rests on the spread is null. */
export type SampleStats = {
  n: number;
  mean: number;
  sd: number | null;
  /** sd / mean, as a fraction; null also when the mean is not above zero. */
  cv: number | null;
  standardError: number | null;
  low95: number | null;
  high95: number | null;
  min: number;
  max: number;
};

/**
 * Mean, spread and 95 % interval of the mean of measured values (lengths in mm, weights in g), by Student's t with n -
 * 1 degrees of freedom; sd with n - 1; cv = sd / mean as a fraction (Sokal & Rohlf, Biometry). The order does not
 * matter. Throws `BadValue` for an empty list or a value that is not a number.
 */
export function sampleStats(values: number[]): SampleStats {
  const n = values.length;
  if (n === 0) throw new BadValue('Sample', values, 'at least one value is needed');
  // Sorted, so that the same fish measured in another order give the same figures to the last digit.
  const sorted = values.map((value, i) => finite(`Value ${i + 1}`, value)).sort((a, b) => a - b);
  const [min, max] = [sorted[0] ?? 0, sorted[n - 1] ?? 0];
  const mean = sorted.reduce((total, value) => total + (value - min), 0) / n + min;
  if (n === 1) return { n, mean, sd: null, cv: null, standardError: null, low95: null, high95: null, min, max };
  const sd = Math.sqrt(sorted.reduce((total, value) => total + (value - mean) ** 2, 0) / (n - 1));
  const standardError = sd / Math.sqrt(n);
  const reach = studentReach(0.95, n - 1) * standardError;
  const cv = mean > 0 ? sd / mean : null;
  return { n, mean, sd, cv, standardError, low95: mean - reach, high95: mean + reach, min, max };
}

/**
 * CV with its small-sample correction (1 + 1/4n) cv (Sokal & Rohlf, Biometry): a few fish look more even than they are.
 */
export const correctedCv = (cv: number, n: number): number =>
  finite('CV', cv, { min: 0 }) * (1 + 1 / (4 * whole('Number of fish', n, 2)));

/**
 * Fish to measure so that the mean is within `relativeError` (0.05 is 5 %) of the batch's, at `confidence`: (z cv /
 * E)^2, rounded up. With `heads`, the fish in the batch, fewer do: n / (1 + (n - 1) / heads) (Cochran 1977, Sampling
 * Techniques). Throws `BadValue` for values that cannot be.
 */
export function samplesNeeded(cv: number, relativeError: number, confidence = 0.95, heads?: number): number {
  const ratio = finite('CV', cv, { min: 0 }) / finite('Relative error', relativeError, { above: 0 });
  const endless = (normalReach(confidence) * ratio) ** 2;
  const needed = heads === undefined ? endless : endless / (1 + (endless - 1) / whole('Head count', heads, 1));
  // A whole number must not become the next one through its last digit.
  return Math.max(1, Math.ceil(finite('Fish needed', needed) - 1e-9));
}

/**
 * Standard deviations that a value may lie from the others before it is asked about, and how many others it takes to
 * judge.
 */
const ODD_SD = 3.5;
const FISH_TO_JUDGE = 5;
/** A brood measured to the millimetre can have no spread at all among the first few. */
const LEAST_SPREAD = 0.05;

/** Whether a newly typed length is far from those before it, so that it is asked about once. */
export function isOdd(value: number, before: number[]): boolean {
  finite('Length', value);
  if (before.length < FISH_TO_JUDGE) return false;
  const { mean, sd } = sampleStats(before);
  return Math.abs(value - mean) > ODD_SD * Math.max(sd ?? 0, LEAST_SPREAD * mean);
}
