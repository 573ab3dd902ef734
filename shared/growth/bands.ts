import { finite } from '../badValue';
import { ageWhen, type GrowthCurve, gainAt, meanLength, residualSdAt, standardErrorAt } from './curve';
import { studentReach } from './studentT';

/** One curve, or several that fit, averaged by their Akaike weights; the weights add up to one. Plain data. */
export type Curves = readonly { curve: GrowthCurve; weight: number }[];

/** Mean length at an age, its interval, and the interval for one fish. */
export type LengthSpan = { mean: number; low: number; high: number; predictionLow: number; predictionHigh: number };

/** Age at which the mean reaches a length. `high` is null when the data cannot rule out that it never does. */
export type AgeSpan = { mean: number; low: number; high: number | null };

/** Longer than any of these fish lives: a curve that has not got there by then never does. */
const LATEST_DAYS = 36_525;

const averaged = (curves: Curves, of: (curve: GrowthCurve) => number) =>
  curves.reduce((sum, { curve, weight }) => sum + weight * of(curve), 0);

export const meanOf = (curves: Curves, ageDays: number): number =>
  averaged(curves, (curve) => meanLength(curve, ageDays));

export const finalOf = (curves: Curves): number => averaged(curves, ({ linfMm }) => linfMm);

/** Standard error of the mean, with the differences between the curves (Burnham & Anderson 2002, equation 4.9). */
export function standardErrorOf(curves: Curves, ageDays: number): number {
  const mean = meanOf(curves, ageDays);
  return averaged(curves, (curve) => Math.hypot(standardErrorAt(curve, ageDays), meanLength(curve, ageDays) - mean));
}

const reachOf = (curves: Curves, level: number) => studentReach(level, curves[0]?.curve.freedom ?? 1);

/**
 * Mean length in mm at an age in days, with the interval of the mean and of one fish at `level`, by Student's t. Before
 * a von Bertalanffy curve's origin the mean is below zero. Throws `BadValue`.
 */
export function lengthOn(curves: Curves, ageDays: number, level = 0.95): LengthSpan {
  const mean = meanOf(curves, finite('Age', ageDays, { min: -1e6, max: 1e6 }));
  const t = reachOf(curves, level);
  const standardError = standardErrorOf(curves, ageDays);
  const reach = t * standardError;
  const forOne =
    t *
    Math.hypot(
      standardError,
      averaged(curves, (curve) => residualSdAt(curve, ageDays)),
    );
  return { mean, low: mean - reach, high: mean + reach, predictionLow: mean - forOne, predictionHigh: mean + forOne };
}

/**
 * How much longer one brood's mean is than another's at the same age, in mm, with its interval. Student's t with the fewer
 * degrees of freedom of the two, which errs on the wide side. Throws `BadValue`.
 */
export function compareAt(one: Curves, other: Curves, ageDays: number, level = 0.95) {
  const differenceMm = lengthOn(one, ageDays).mean - lengthOn(other, ageDays).mean;
  const doubt = Math.hypot(standardErrorOf(one, ageDays), standardErrorOf(other, ageDays));
  const reach = Math.max(reachOf(one, level), reachOf(other, level)) * doubt;
  return { differenceMm, low: differenceMm - reach, high: differenceMm + reach };
}

/**
 * Age in days at which the mean length reaches `lengthMm`, with its interval: the ages whose band of the mean holds the
 * length (inverse regression; Draper & Smith 1998, Applied Regression Analysis, 3.2). `alsoSdMm` is the standard error
 * of the length itself, where that is worked out too. Null when the mean never gets there. Throws `BadValue`.
 */
export function ageSpanAt(curves: Curves, lengthMm: number, level = 0.95, alsoSdMm = 0): AgeSpan | null {
  const mean = meanAge(curves, finite('Length', lengthMm));
  const t = reachOf(curves, level);
  if (mean === null) return null;
  const reach = (age: number) => t * Math.hypot(standardErrorOf(curves, age), alsoSdMm);
  const gain = averaged(curves, (curve) => gainAt(curve, mean));
  const stride = Math.min(LATEST_DAYS, reach(mean) / Math.max(gain, 1e-12));
  if (stride < 1e-9) return { mean, low: mean, high: mean };
  const above = (age: number) => meanOf(curves, age) + reach(age) - lengthMm;
  const below = (age: number) => meanOf(curves, age) - reach(age) - lengthMm;
  const earliest = Math.min(0, mean);
  return {
    mean,
    low: crossing(above, { from: mean, stride: -stride, limit: earliest }) ?? earliest,
    high: crossing(below, { from: mean, stride, limit: LATEST_DAYS }),
  };
}

function meanAge(curves: Curves, lengthMm: number): number | null {
  if (!(lengthMm > 0 && lengthMm < finalOf(curves))) return null;
  const ages = curves.map(({ curve }) => ageWhen(curve, lengthMm));
  const known = ages.filter((age) => age !== null);
  const [first, last] = [Math.min(...known), known.length < ages.length ? LATEST_DAYS : Math.max(...known)];
  const age = first < last ? rootBetween((at) => meanOf(curves, at) - lengthMm, first, last) : first;
  return Math.abs(age) < LATEST_DAYS - 1 ? age : null;
}

/** Where `f` changes sign, going from `from` by growing strides as far as `limit`; null when it does not. */
function crossing(f: (age: number) => number, way: { from: number; stride: number; limit: number }): number | null {
  const { from, stride, limit } = way;
  const sign = Math.sign(f(from));
  let [near, step] = [from, stride / 4];
  while (near !== limit) {
    const far = Math.abs(near + step - from) >= Math.abs(limit - from) ? limit : near + step;
    if (Math.sign(f(far)) !== sign) return rootBetween(f, near, far);
    near = far;
    step *= 1.2;
  }
  return null;
}

/** False position, halving the weight of an end that stays (Dowell & Jarratt 1971): the bracket shrinks from both sides. */
function rootBetween(f: (age: number) => number, one: number, other: number): number {
  let [a, b, fa, fb] = [one, other, f(one), f(other)];
  for (let i = 0; i < 200 && Math.abs(b - a) > 1e-10 * (1 + Math.abs(b)) && fb !== 0; i += 1) {
    const c = fa === fb ? (a + b) / 2 : b - (fb * (b - a)) / (fb - fa);
    const fc = f(c);
    if (Math.sign(fc) === Math.sign(fb)) fa /= 2;
    else [a, fa] = [b, fb];
    if (Math.abs(c - b) < 1e-11 * (1 + Math.abs(c))) return c;
    [b, fb] = [c, fc];
  }
  return b;
}
