import { finite } from '../badValue';
import { GrowthError } from './growthError';
import { studentT } from './studentT';

type Measured = { value: number; day: number };

/**
 * Specific growth rate in % per day: 100 (ln v2 - ln v1) / days. Of weight, unless the screen says of length. Null where a
 * value is not above zero or no time has passed.
 */
export function specificGrowthRate(from: Measured, to: Measured): number | null {
  const days = finite('Day', to.day) - finite('Day', from.day);
  if (finite('First value', from.value) <= 0 || finite('Second value', to.value) <= 0 || days <= 0) return null;
  return (100 * (Math.log(to.value) - Math.log(from.value))) / days;
}

/** Absolute growth rate per day; null where no time has passed. */
export function absoluteGrowthRate(from: Measured, to: Measured): number | null {
  const days = finite('Day', to.day) - finite('Day', from.day);
  return days <= 0 ? null : (to.value - from.value) / days;
}

/** Days in which a value doubles at a specific growth rate in % per day; null at or below zero. */
export const doublingDays = (percentPerDay: number): number | null =>
  finite('Growth rate', percentPerDay) <= 0 ? null : (100 * Math.LN2) / percentPerDay;

/** Fulton's condition factor 100 W / L³, in g and cm (Fulton 1904). Total and standard length give different factors. */
export function fultonK(weightG: number, lengthMm: number): number {
  finite('Weight', weightG, { above: 0 });
  const cm = finite('Length', lengthMm, { above: 0 }) / 10;
  return (100 * weightG) / cm ** 3;
}

/** Le Cren's relative condition W / (a L^b), in g and cm (Le Cren 1951). */
export function relativeCondition(weightG: number, lengthMm: number, { a, b }: { a: number; b: number }): number {
  return (
    finite('Weight', weightG, { above: 0 }) /
    (finite('a', a, { above: 0 }) * (finite('Length', lengthMm, { above: 0 }) / 10) ** finite('b', b))
  );
}

/** Mean condition 100 a L^(b - 3) at a length, in g and cm (Froese 2006). */
export const meanCondition = (lengthMm: number, { a, b }: { a: number; b: number }): number =>
  100 * finite('a', a, { above: 0 }) * (finite('Length', lengthMm, { above: 0 }) / 10) ** (finite('b', b) - 3);

/** Growth performance log10 K + 2 log10 Linf, K per year and Linf in cm (Pauly & Munro 1984). */
export const growthPerformance = (linfMm: number, kPerYear: number): number =>
  Math.log10(finite('K', kPerYear, { above: 0 })) + 2 * Math.log10(finite('Linf', linfMm, { above: 0 }) / 10);

export type LengthWeightFit = {
  /** Corrected for the bias of going back from logarithms. */
  a: number;
  b: number;
  seB: number;
  n: number;
  residualVariance: number;
  b95: { low: number; high: number };
  weightAt(lengthMm: number): number;
};

/**
 * Length-weight relation W = a L^b, in cm and g: least squares of ln W on ln L, taken back with exp(s²/2) (Sprugel 1983).
 * Throws `BadValue` for values not above zero, `GrowthError` for fewer than three pairs or lengths all alike.
 */
export function lengthWeight(pairs: { lengthMm: number; weightG: number }[]): LengthWeightFit {
  if (pairs.length < 3) throw new GrowthError('tooFewPoints', 'At least three fish with length and weight are needed');
  const points = pairs.map(({ lengthMm, weightG }) => ({
    x: Math.log(finite('Length', lengthMm, { above: 0 }) / 10),
    y: Math.log(finite('Weight', weightG, { above: 0 })),
  }));
  const n = points.length;
  const meanX = points.reduce((sum, { x }) => sum + x, 0) / n;
  const meanY = points.reduce((sum, { y }) => sum + y, 0) / n;
  const sxx = points.reduce((sum, { x }) => sum + (x - meanX) ** 2, 0);
  if (sxx < 1e-12) throw new GrowthError('notIdentifiable', 'Lengths that differ are needed');
  const b = points.reduce((sum, { x, y }) => sum + (x - meanX) * (y - meanY), 0) / sxx;
  const lnA = meanY - b * meanX;
  const residualVariance = points.reduce((sum, { x, y }) => sum + (y - lnA - b * x) ** 2, 0) / (n - 2);
  const a = Math.exp(lnA + residualVariance / 2);
  const seB = Math.sqrt(residualVariance / sxx);
  const aside = studentT(0.95, n - 2) * seB;
  return {
    a,
    b,
    seB,
    n,
    residualVariance,
    b95: { low: b - aside, high: b + aside },
    weightAt: (lengthMm) => a * (finite('Length', lengthMm, { above: 0 }) / 10) ** b,
  };
}
