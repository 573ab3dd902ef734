export type Point = { readonly x: number; readonly y: number };
export type Knots = readonly (readonly [number, number])[];

export const point = (x: number, y: number): Point => ({ x, y });
export const lerp = (from: number, to: number, share: number): number => from + (to - from) * share;
export const clamp = (value: number, low: number, high: number): number => Math.max(low, Math.min(high, value));

/** Rises smoothly from 0 at `low` to 1 at `high`. */
export function ease(low: number, high: number, value: number): number {
  const share = clamp((value - low) / (high - low), 0, 1);
  return share * share * (3 - 2 * share);
}

/** n + 1 evenly spaced numbers from 0 to 1. */
export const steps = (n: number): number[] => Array.from({ length: n + 1 }, (_, i) => i / n);

/** A curve through knots of rising x that never overshoots them (Fritsch and Carlson 1980). */
export function through(knots: Knots): (x: number) => number {
  const xs = knots.map(([x]) => x);
  const ys = knots.map(([, y]) => y);
  const slopes = slopesOf(xs, ys);
  return (x) => {
    const last = xs.length - 1;
    if (x <= (xs[0] ?? 0)) return ys[0] ?? 0;
    if (x >= (xs[last] ?? 0)) return ys[last] ?? 0;
    const i = xs.findIndex((knot, k) => k > 0 && x <= knot) - 1;
    const width = (xs[i + 1] ?? 0) - (xs[i] ?? 0);
    const t = (x - (xs[i] ?? 0)) / width;
    const t2 = t * t;
    const t3 = t2 * t;
    return (
      (2 * t3 - 3 * t2 + 1) * (ys[i] ?? 0) +
      (t3 - 2 * t2 + t) * width * (slopes[i] ?? 0) +
      (3 * t2 - 2 * t3) * (ys[i + 1] ?? 0) +
      (t3 - t2) * width * (slopes[i + 1] ?? 0)
    );
  };
}

function slopesOf(xs: number[], ys: number[]): number[] {
  const chords = xs.slice(1).map((x, i) => ((ys[i + 1] ?? 0) - (ys[i] ?? 0)) / (x - (xs[i] ?? 0)));
  return xs.map((_, i) => {
    const before = chords[i - 1] ?? chords[i] ?? 0;
    const after = chords[i] ?? chords[i - 1] ?? 0;
    if (before * after <= 0) return 0;
    return (2 * before * after) / (before + after);
  });
}

const figure = (value: number): string => String(Math.round(value * 100) / 100);
const pair = (p: Point): string => `${figure(p.x)} ${figure(p.y)}`;

/** Straight lines from point to point. */
export function linePath(points: readonly Point[], closed = false): string {
  return `M${points.map(pair).join('L')}${closed ? 'Z' : ''}`;
}

/** A smooth line through every point (Catmull and Rom 1974, as cubic pieces). */
export function smoothPath(points: readonly Point[], closed = false): string {
  const n = points.length;
  const get = (i: number): Point => {
    const k = closed ? (i + n) % n : clamp(i, 0, n - 1);
    return points[k] ?? { x: 0, y: 0 };
  };
  const pieces = [`M${pair(get(0))}`];
  for (let i = 0; i < (closed ? n : n - 1); i++) {
    const [a, b, c, d] = [get(i - 1), get(i), get(i + 1), get(i + 2)];
    const first = { x: b.x + (c.x - a.x) / 6, y: b.y + (c.y - a.y) / 6 };
    const second = { x: c.x - (d.x - b.x) / 6, y: c.y - (d.y - b.y) / 6 };
    pieces.push(`C${pair(first)} ${pair(second)} ${pair(c)}`);
  }
  return pieces.join('') + (closed ? 'Z' : '');
}
