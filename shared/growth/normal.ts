import { finite } from '../badValue';

const DENSITY_AT_ZERO = 1 / Math.sqrt(2 * Math.PI);
/** Beyond this the series loses digits and the tail's continued fraction is exact. */
const TAIL = 3;

const density = (z: number) => DENSITY_AT_ZERO * Math.exp((-z * z) / 2);

/**
 * Share of a standard normal distribution below `z`, to 1e-13 of itself. Series of Marsaglia (2004, J Stat Softw 11(4))
 * near the middle, Laplace's continued fraction in the tails. Throws `BadValue` unless `z` is a number.
 */
export function normalShareBelow(z: number): number {
  finite('Normal deviate', z);
  if (z < -TAIL) return tailBelow(z);
  if (z > TAIL) return 1 - tailBelow(-z);
  let [sum, term] = [z, z];
  for (let i = 3; Math.abs(term) > 1e-17; i += 2) {
    term *= (z * z) / i;
    sum += term;
  }
  return 0.5 + sum * density(z);
}

function tailBelow(z: number): number {
  let fraction = -z;
  for (let i = 150; i >= 1; i -= 1) fraction = -z + i / fraction;
  return density(z) / fraction;
}

/**
 * The standard normal deviate with `share` of the distribution below it, to 1e-13. Start: Abramowitz & Stegun (1964)
 * 26.2.23; then Halley's steps on `normalShareBelow`. Throws `BadValue` unless the share lies between 0 and 1.
 */
export function normalQuantile(share: number): number {
  finite('Share', share, { above: 0 });
  if (share >= 1) finite('Share', share, { max: 1 - Number.EPSILON / 2 });
  if (share === 0.5) return 0;
  if (share > 0.5) return -normalQuantile(1 - share);
  const t = Math.sqrt(-2 * Math.log(share));
  const start = (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)));
  let z = start - t;
  for (let i = 0; i < 4; i += 1) {
    const newton = (normalShareBelow(z) - share) / density(z);
    z -= newton / (1 + (z * newton) / 2);
  }
  return z;
}

/** How many standard errors a two-sided normal interval reaches either way: 1.96 for 0.95. */
export const normalReach = (confidence: number): number =>
  -normalQuantile((1 - finite('Confidence', confidence, { above: 0, max: 1 - 1e-12 })) / 2);
