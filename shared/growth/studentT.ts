import { finite } from '../badValue';
import { normalQuantile } from './normal';

/** Lanczos' coefficients for g = 7, nine terms (Godfrey 2001): the logarithm of the gamma function to 1e-15. */
const LANCZOS = [
  676.5203681218851, -1259.1392167224028, 771.3234287776531, -176.6150291621406, 12.507343278686905,
  -0.13857109526572012, 9.984369578019572e-6, 1.5056327351493116e-7,
] as const;

export function logGamma(x: number): number {
  const sum = LANCZOS.reduce((total, c, i) => total + c / (x + i), 0.9999999999998099);
  const t = x + 6.5;
  return Math.log(Math.sqrt(2 * Math.PI) * sum) + (x - 0.5) * Math.log(t) - t;
}

/** Lentz's continued fraction of the incomplete beta function (Press et al., Numerical Recipes, 6.4). */
function betaFraction(x: number, a: number, b: number): number {
  const tiny = 1e-300;
  const safe = (value: number) => (Math.abs(value) < tiny ? tiny : value);
  let c = 1;
  let d = 1 / safe(1 - ((a + b) * x) / (a + 1));
  let fraction = d;
  for (let m = 1; m <= 500; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    for (const part of [even, odd]) {
      d = 1 / safe(1 + part * d);
      c = safe(1 + part / c);
      fraction *= d * c;
    }
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return fraction;
}

/** Regularised incomplete beta function I_x(a, b); `y` is 1 - x, given so that it keeps its digits near x = 1. */
function betaShare(x: number, y: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(y));
  return x < (a + 1) / (a + b + 2) ? (front * betaFraction(x, a, b)) / a : 1 - (front * betaFraction(y, b, a)) / b;
}

/** Share of Student's t distribution above `t` >= 0. */
const shareAbove = (t: number, df: number) => betaShare(df / (df + t * t), (t * t) / (df + t * t), df / 2, 0.5) / 2;

/**
 * Share of Student's t distribution with `df` degrees of freedom at least as far from zero as `t`: the two-sided p
 * value. Throws `BadValue` for a `df` that is not above zero.
 */
export function studentTwoSided(t: number, df: number): number {
  return 2 * shareAbove(Math.abs(finite('t', t)), finite('Degrees of freedom', df, { above: 0 }));
}

/** The normal deviate widened for `df`, exact to second order (Cornish & Fisher; Abramowitz & Stegun 1964, 26.7.5). */
function startOf(z: number, df: number): number {
  return z + (z ** 3 + z) / (4 * df) + (5 * z ** 5 + 16 * z ** 3 + 3 * z) / (96 * df * df);
}

/**
 * How many standard errors a two-sided interval by Student's t reaches either way, to 1e-9: 2.262 for 0.95 and 9
 * degrees of freedom (Student 1908). Solved on the incomplete beta function; one and two degrees of freedom are closed
 * forms. Throws `BadValue` for a confidence outside 0 to 1 or a `df` that is not above zero.
 */
export function studentReach(confidence: number, df: number): number {
  const tail = (1 - finite('Confidence', confidence, { above: 0, max: 1 - 1e-12 })) / 2;
  finite('Degrees of freedom', df, { above: 0 });
  if (df === 1) return 1 / Math.tan(Math.PI * tail);
  if (df === 2) return confidence * Math.sqrt(2 / (1 - confidence * confidence));
  // Solved in log t and log share: the tail is close to a power of t, so that Newton's steps never leave its side.
  const logDensity = logGamma((df + 1) / 2) - logGamma(df / 2) - Math.log(Math.sqrt(df * Math.PI));
  let t = startOf(-normalQuantile(tail), df);
  for (let i = 0; i < 50; i += 1) {
    const share = shareAbove(t, df);
    const slope = (t / share) * Math.exp(logDensity - ((df + 1) / 2) * Math.log1p((t * t) / df));
    const step = Math.log(share / tail) / slope;
    t *= Math.exp(step);
    if (Math.abs(step) < 1e-14) break;
  }
  return t;
}
