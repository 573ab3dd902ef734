import { finite, whole } from '../badValue';
import type { Diet } from '../species/species';

/**
 * Food for a tank's fish in grams a day: biomass times `percentBodyWeight` / 100, with the weight of a fish W = a L^b in
 * grams and centimetres, L being the mean total length. Uneven fish weigh more than their mean length says: with `cv` (sd /
 * mean of the lengths) the mean of L^b is corrected to second order. Fry growth guides use the same product.
 * Throws `BadValue` for values that cannot be.
 */
export function ration(
  tank: { headCount: number; meanLengthMm: number; cv?: number },
  feeding: { a: number; b: number; percentBodyWeight: number },
): { gramsPerDay: number; meanWeightG: number; biomassG: number } {
  const heads = whole('Head count', tank.headCount);
  const length = finite('Mean length', tank.meanLengthMm, { above: 0 }) / 10;
  const cv = finite('Unevenness', tank.cv ?? 0, { min: 0, max: 1 });
  const a = finite('Length-weight factor', feeding.a, { above: 0 });
  const b = finite('Length-weight exponent', feeding.b, { above: 0, max: 5 });
  const percent = finite('Percentage of body weight', feeding.percentBodyWeight, { min: 0, max: 100 });
  const meanWeightG = a * length ** b * (1 + ((b * (b - 1)) / 2) * cv ** 2);
  const biomassG = heads * meanWeightG;
  return { gramsPerDay: (biomassG * percent) / 100, meanWeightG, biomassG };
}

/** Feed makers' guide for young tilapia, upper weight in grams and percent of body weight a day. */
const GUIDE: readonly { toG: number; percent: readonly [low: number, high: number] }[] = [
  { toG: 2.5, percent: [8, 9] },
  { toG: 10, percent: [7, 8] },
  { toG: 25, percent: [6, 7] },
];

export type RationGuide = { percent: readonly [low: number, high: number]; source: string } | { none: string };

/**
 * Where to start with the percentage. Measured only for young tilapia; a grazer is fed to appetite and a larger fish by the
 * keeper's own experience, so for both there is no figure.
 */
export function rationGuide(meanWeightG: number, diet: Diet | null): RationGuide {
  const weight = finite('Mean weight', meanWeightG, { above: 0 });
  if (diet === 'aufwuchs') return { none: 'Grazers are fed to appetite, little and often: no figure is known.' };
  const step = GUIDE.find(({ toG }) => weight <= toG);
  if (!step) return { none: 'No figure is known for fish of this size.' };
  return { percent: step.percent, source: 'Feed maker’s guide for young tilapia; other species eat differently.' };
}
