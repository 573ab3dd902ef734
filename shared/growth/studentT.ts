import { finite } from '../badValue';

/** Lanczos, g = 7, nine terms: about 15 digits for x above zero. */
const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

function logGamma(x: number): number {
  const [first = 1, ...rest] = LANCZOS;
  const sum = rest.reduce((total, term, i) => total + term / (x + i), first);
  const t = x + 6.5;
  return 0.5 * Math.log(2 * Math.PI) + (x - 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Regularised incomplete beta function by its continued fraction (Lentz), as in the Handbook of Mathematical Functions 26.5.8. */
function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(1 - x)) / a;
  let f = 1;
  let c = 1;
  let d = 0;
  for (let i = 0; i < 400; i += 1) {
    const m = Math.floor(i / 2);
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    const odd = -((a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    const term = i === 0 ? 1 : i % 2 === 0 ? even : odd;
    d = 1 / kept(1 + term * d);
    c = kept(1 + term / c);
    f *= c * d;
    if (Math.abs(1 - c * d) < 1e-16) break;
  }
  return front * (f - 1);
}

const kept = (value: number): number => (Math.abs(value) < 1e-300 ? 1e-300 : value);

/** Upper tail of Student's t at `t` with `df` degrees of freedom. */
function upperTail(t: number, df: number): number {
  const tail = 0.5 * incompleteBeta(df / (df + t * t), df / 2, 0.5);
  return t >= 0 ? tail : 1 - tail;
}

/**
 * The two-sided quantile of Student's t: `confidence` of the distribution lies within ± this. 2.228 for 0.95 and 10 degrees
 * of freedom (any table of t). Throws `BadValue` for a confidence outside 0 to 1 or fewer than one degree of freedom.
 */
export function studentT(confidence: number, df: number): number {
  finite('Confidence', confidence, { above: 0, max: 0.999999 });
  finite('Degrees of freedom', df, { min: 1 });
  const tail = (1 - confidence) / 2;
  let [low, high] = [0, 1];
  while (upperTail(high, df) > tail) [low, high] = [high, high * 2];
  for (let i = 0; i < 200 && high - low > 1e-15 * high; i += 1) {
    const middle = (low + high) / 2;
    if (upperTail(middle, df) > tail) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** The two-sided quantile of the normal distribution; 1.96 for 0.95. */
export function normalQuantile(confidence: number): number {
  finite('Confidence', confidence, { above: 0, max: 0.999999 });
  let [low, high] = [0, 10];
  for (let i = 0; i < 200 && high - low > 1e-15 * high; i += 1) {
    const middle = (low + high) / 2;
    if (2 * normalCdf(middle) - 1 < confidence) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Share of a standard normal distribution below `z`: the error function by series near zero, by continued fraction beyond. */
export function normalCdf(z: number): number {
  const x = Math.abs(z) / Math.SQRT2;
  const tail = x < 2.5 ? 0.5 * (1 - erfSeries(x)) : 0.5 * erfcFraction(x);
  return z >= 0 ? 1 - tail : tail;
}

function erfSeries(x: number): number {
  let [term, sum] = [x, x];
  for (let n = 1; n < 200 && Math.abs(term) > 1e-18; n += 1) {
    term *= (-x * x) / n;
    sum += term / (2 * n + 1);
  }
  return (2 / Math.sqrt(Math.PI)) * sum;
}

function erfcFraction(x: number): number {
  let fraction = 0;
  for (let n = 80; n >= 1; n -= 1) fraction = n / 2 / (x + fraction);
  return Math.exp(-x * x) / (Math.sqrt(Math.PI) * (x + fraction));
}
