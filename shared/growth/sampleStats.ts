import { finite, whole } from '../badValue';
import { GrowthError } from './growthError';
import { normalCdf, normalQuantile, studentT } from './studentT';

/** `cv` is a fraction of the mean; null where one value says nothing of spread. */
export type SampleStats = {
  n: number;
  mean: number;
  sd: number | null;
  cv: number | null;
  standardError: number | null;
  low95: number | null;
  high95: number | null;
  min: number;
  max: number;
};

/**
 * Mean, standard deviation (n - 1), coefficient of variation and the 95 % interval of the mean by Student's t. Throws
 * `GrowthError` for an empty sample, `BadValue` for a value that is no number.
 */
export function sampleStats(values: number[]): SampleStats {
  if (values.length === 0) throw new GrowthError('tooFewPoints', 'At least one value is needed');
  const sorted = values.map((value) => finite('Value', value)).toSorted((a, b) => a - b);
  const n = sorted.length;
  const mean = sorted.reduce((sum, value) => sum + value, 0) / n;
  const [min = mean, max = mean] = [sorted[0], sorted.at(-1)];
  if (n < 2) return { n, mean, sd: null, cv: null, standardError: null, low95: null, high95: null, min, max };
  const sd = Math.sqrt(sorted.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (n - 1));
  const standardError = sd / Math.sqrt(n);
  const aside = studentT(0.95, n - 1) * standardError;
  return {
    n,
    mean,
    sd,
    cv: mean === 0 ? null : sd / mean,
    standardError,
    low95: mean - aside,
    high95: mean + aside,
    min,
    max,
  };
}

/** Share of fish at or over a length, their lengths being normal about `meanMm` with coefficient of variation `cv`. */
export function shareAtLeast(lengthMm: number, at: { meanMm: number; cv: number }): number {
  finite('Length', lengthMm);
  const mean = finite('Mean length', at.meanMm, { above: 0 });
  const cv = finite('Coefficient of variation', at.cv, { min: 0 });
  if (cv === 0) return mean >= lengthMm ? 1 : 0;
  return 1 - normalCdf((lengthMm - mean) / (cv * mean));
}

/**
 * Fish to measure so that the mean is known to within `relativeError` of itself: (z cv / E)², rounded up; for a brood of
 * `heads` fish less, by the finite-population correction (Cochran 1977).
 */
export function samplesNeeded(
  cv: number,
  relativeError: number,
  confidence = 0.95,
  heads: number | null = null,
): number {
  finite('Coefficient of variation', cv, { min: 0 });
  finite('Relative error', relativeError, { above: 0 });
  const raw = ((normalQuantile(confidence) * cv) / relativeError) ** 2;
  if (heads === null) return Math.ceil(raw);
  return Math.ceil(raw / (1 + (raw - 1) / whole('Heads', heads, 1)));
}

/** From this unevenness large fish begin to hold back small ones: time to grade. Common practice, no source. */
export const GRADE_FROM_CV = 0.2;

export const isUneven = (cv: number | null): boolean => cv !== null && cv >= GRADE_FROM_CV;

/** Standard deviations that a value may lie from the others before it is asked about. */
const ODD_SD = 3.5;

/** Whether a newly typed length is far from those before it: asked about once. Five before it are enough to judge by. */
export function isOdd(value: number, before: number[]): boolean {
  finite('Length', value);
  if (before.length < 5) return false;
  const { mean, sd } = sampleStats(before);
  // A brood measured to the millimetre can have no spread at all among the first few.
  const spread = Math.max(sd ?? 0, 0.05 * mean);
  return Math.abs(value - mean) > ODD_SD * spread;
}
