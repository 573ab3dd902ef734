import { finite } from '../badValue';
import { CannotFit } from './cannotFit';
import { studentReach, studentTwoSided } from './studentT';

const FEWEST = 3;

export type LengthWeight = {
  /** Corrected for the bias of going back from logarithms. */
  a: number;
  b: number;
  seB: number;
  n: number;
  /**
   * ln of the factor before the correction, its standard error, and the variance about the line that makes the
   * correction.
   */
  lnA: number;
  seLnA: number;
  residualVariance: number;
  rSquared: number;
  b95: { low: number; high: number };
  /** Whether the fish keep their shape (b = 3): t and its two-sided p. Null when all pairs lie on the line. */
  isometry: { t: number; p: number } | null;
  weightAt(lengthMm: number): number;
};

/**
 * Weight from length, W = a L^b in grams and centimetres (lengths are given in mm): least squares of ln W on ln L, `a`
 * brought back with its correction exp(s^2 / 2) (Sprugel 1983, Ecology 64:209; Baskerville 1972). `b` of 2.5 to 3.5 is
 * usual (Froese 2006). Throws `BadValue` for a length or weight not above zero, `CannotFit` under three fish or with
 * one length.
 */
export function lengthWeight(pairs: { lengthMm: number; weightG: number }[]): LengthWeight {
  const n = pairs.length;
  const points = pairs.map(({ lengthMm, weightG }, i) => ({
    x: Math.log(finite(`Length of fish ${i + 1}`, lengthMm, { above: 0 }) / 10),
    y: Math.log(finite(`Weight of fish ${i + 1}`, weightG, { above: 0 })),
  }));
  if (n < FEWEST) throw new CannotFit('tooFewFish', { needed: FEWEST, there: n });
  const line = logLine(points.sort((p, q) => p.x - q.x || p.y - q.y));
  const { b, lnA, seB, residualVariance } = line;
  const a = Math.exp(lnA + residualVariance / 2);
  const reach = studentReach(0.95, n - 2) * seB;
  const t = (b - 3) / seB;
  return {
    ...line,
    a,
    n,
    b95: { low: b - reach, high: b + reach },
    isometry: Number.isFinite(t) ? { t, p: studentTwoSided(t, n - 2) } : null,
    weightAt: (lengthMm) => a * (finite('Length', lengthMm, { above: 0 }) / 10) ** b,
  };
}

function logLine(points: { x: number; y: number }[]) {
  const n = points.length;
  const mean = (of: (point: { x: number; y: number }) => number) => points.reduce((sum, p) => sum + of(p), 0) / n;
  const [meanX, meanY] = [mean(({ x }) => x), mean(({ y }) => y)];
  const sxx = n * mean(({ x }) => (x - meanX) ** 2);
  const syy = n * mean(({ y }) => (y - meanY) ** 2);
  // Lengths are read to a tenth of a millimetre at best: closer than that they are one length.
  if (sxx < 1e-12) throw new CannotFit('oneLength');
  const b = (n * mean(({ x, y }) => (x - meanX) * (y - meanY))) / sxx;
  const rss = n * mean(({ x, y }) => (y - meanY - b * (x - meanX)) ** 2);
  const residualVariance = rss / (n - 2);
  return {
    b,
    lnA: meanY - b * meanX,
    seB: Math.sqrt(residualVariance / sxx),
    seLnA: Math.sqrt(residualVariance * (1 / n + meanX ** 2 / sxx)),
    residualVariance,
    rSquared: syy > 0 ? 1 - rss / syy : 1,
  };
}
