import type { Fan, LongFin, TailFin } from './anatomy';
import type { Body } from './body';
import { clamp, ease, lerp, type Point, point, steps, through } from './curve';

/** A fin as a sheet: t along its base (front to back, or top to bottom), s from the base (0) to the edge (1). */
export type Fin = {
  at: (t: number, s: number) => Point;
  /** Places along t of hard spines and soft rays. */
  spines: readonly number[];
  rays: readonly number[];
  /** Where the membrane ends along t, as a share of the height there. */
  edge: (t: number) => number;
};

const HALF_LINE = 0.0008;
const RAD = Math.PI / 180;

/** Dorsal fin with side -1, anal fin with side 1. */
export function longFin(body: Body, shape: LongFin, side: -1 | 1): Fin {
  const height = through(shape.height);
  const lean = through(shape.lean);
  const count = shape.spines + shape.rays;
  const hard = shape.spines / count;
  const spines = Array.from({ length: shape.spines }, (_, i) => (i + 0.15) / count);
  const rays = Array.from({ length: shape.rays }, (_, i) => (shape.spines + i + 0.5) / count);
  const at = (t: number, s: number): Point => {
    const root = body.on(lerp(shape.from, shape.to, t), side * 0.985);
    // Soft rays sweep back towards their tips; spines stand straight.
    const angle = (lean(t) + 16 * (s - 0.5) * ease(hard - 0.04, hard + 0.12, t)) * RAD;
    const reach = height(t) * s;
    return point(root.x + reach * Math.sin(angle), root.y + side * reach * Math.cos(angle));
  };
  const edge = (t: number): number => {
    if (t >= hard) return 1;
    const between = t * count - 0.15;
    const share = between - Math.floor(between);
    return 1 - shape.notch * Math.sin(Math.PI * clamp(share, 0, 1)) ** 0.8 * (between < 0 ? 0 : 1);
  };
  return { at, edge, spines, rays };
}

export function tailFin(body: Body, shape: TailFin): Fin {
  const { standard } = body.anatomy;
  const reach = 1 - standard;
  const rays = Array.from({ length: shape.rays }, (_, i) => (i + 0.5) / shape.rays);
  const shortfall = (t: number): number => {
    const away = Math.abs(2 * t - 1) ** shape.lobe;
    const lobe = clamp((Math.abs(2 * t - 1) - 0.84) / 0.16, 0, 1);
    return (shape.fork >= 0 ? shape.fork * (1 - away) : -shape.fork * away) + 0.1 * lobe * lobe;
  };
  // The longest ray, with half the width of its line, ends at 1 exactly: that is the total length.
  const least = Math.min(...steps(60).map(shortfall));
  const tip = (t: number): Point => point(1 - HALF_LINE - (shortfall(t) - least) * reach, (2 * t - 1) * shape.span);
  const at = (t: number, s: number): Point => {
    const v = 2 * t - 1;
    const root = body.on(standard - 0.012, v * 0.94);
    const end = tip(t);
    const x = lerp(root.x, end.x, s);
    // The outer edges of the tail are a little convex.
    const y = lerp(root.y, end.y, s) + v * 0.07 * shape.span * Math.sin(Math.PI * clamp(s, 0, 1));
    return point(x, y);
  };
  return { at, edge: () => 1, spines: [], rays };
}

/** Pelvic and pectoral fins: rays from a short base. */
export function fan(body: Body, shape: Fan, lift = 0): Fin {
  const root = body.on(shape.x, shape.v);
  const rays = Array.from({ length: shape.rays }, (_, i) => (i + 0.5) / shape.rays);
  const at = (t: number, s: number): Point => {
    const angle = (shape.angle + lift + (0.5 - t) * shape.spread) * RAD;
    // `point` 0 gives a round fin; 1 a blade whose leading ray is much the longest.
    const round = 1 - 0.35 * (2 * t - 1) ** 2;
    const blade = 1 - 0.62 * t ** 0.8;
    const reach = shape.length * lerp(round, blade, shape.point) * s;
    const base = point(
      root.x + (t - 0.5) * shape.length * 0.16,
      root.y + (t - 0.5) * shape.length * 0.1 * (1 - shape.point),
    );
    const bow = 10 * RAD * s * shape.point;
    return point(base.x + reach * Math.cos(angle - bow), base.y + reach * Math.sin(angle - bow));
  };
  return { at, edge: () => 1, spines: [], rays };
}
