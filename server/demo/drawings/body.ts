import type { Anatomy } from './anatomy';
import { ease, lerp, type Point, point, through } from './curve';

/** The flank as a surface: x along the fish, v from the back (-1) to the belly (1). */
export type Body = {
  anatomy: Anatomy;
  on: (x: number, v: number) => Point;
  /** Places along x that lie closer together at the blunt snout. */
  xs: readonly number[];
};

/** What swells the underside: a mouthful of eggs or fry, or a yolk sac. */
export type Swelling = { from: number; to: number; depth: number };

const SNOUT = 0.0025;

export function bodyOf(anatomy: Anatomy, swelling?: Swelling): Body {
  // Interpolating over the root of x gives the snout an upright tangent, so that it is round and not a wedge.
  const rooted = (knots: Anatomy['back']) => through(knots.map(([x, y]) => [Math.sqrt(Math.max(0, x)), y]));
  // The profile starts at the lips, wherever the mouth sits.
  const { y, lip } = anatomy.mouth;
  const back = rooted([[0, -(y - 0.5 * lip)], ...anatomy.back.filter(([x]) => x > 0)]);
  const belly = rooted([[0, y + 0.5 * lip], ...anatomy.belly.filter(([x]) => x > 0)]);
  const swell = (x: number): number => {
    if (!swelling || x <= swelling.from || x >= swelling.to) return 0;
    const share = (x - swelling.from) / (swelling.to - swelling.from);
    return swelling.depth * Math.sin(Math.PI * share ** 0.8) ** 1.4;
  };
  // Every band of skin asks for the same places along x.
  const known = new Map<number, { top: number; bottom: number; hip: number }>();
  const sectionAt = (x: number) => {
    const found = known.get(x);
    if (found) return found;
    const root = Math.sqrt(Math.max(0, x));
    const hip = 0.016 * ease(anatomy.standard - 0.08, anatomy.standard, x);
    const section = { top: -back(root), bottom: belly(root) + swell(x), hip };
    known.set(x, section);
    return section;
  };
  const on = (x: number, v: number): Point => {
    const { top, bottom, hip } = sectionAt(x);
    return point(x + hip * (1 - v * v), lerp(top, bottom, (v + 1) / 2));
  };
  const n = 56;
  const xs = Array.from({ length: n + 1 }, (_, i) => lerp(SNOUT, anatomy.standard, (i / n) ** 1.6));
  return { anatomy, on, xs };
}

/** The band of flank between two heights, as a ring of points. */
export function flank(body: Body, upper: number, lower: number): Point[] {
  const tail = [0.25, 0.5, 0.75].map((share) => body.on(body.anatomy.standard, lerp(upper, lower, share)));
  return [...body.xs.map((x) => body.on(x, upper)), ...tail, ...[...body.xs].reverse().map((x) => body.on(x, lower))];
}

const EYE_GROWTH = -0.2;

/**
 * The build at a length: young fish have larger eyes and heads, slimmer bodies and lower fins. The exponent of the eye is
 * from memory of cichlid growth series (eyes grow slower than the body).
 */
export function anatomyAt(adult: Anatomy, shareOfAdult: number): Anatomy {
  const share = Math.min(1, Math.max(0.06, shareOfAdult));
  const slim = 0.76 + 0.24 * share ** 0.5;
  const low = 0.72 + 0.28 * share ** 0.6;
  const eye = Math.min(1.7, share ** EYE_GROWTH);
  const head = 1 + 0.12 * (1 - share);
  const shrink = (knots: Anatomy['back']): Anatomy['back'] =>
    knots.map(([x, y]) => [x, y * lerp(1, slim, ease(0.05, 0.4, x))]);
  const hump = adult.hump ? through(adult.hump) : () => 0;
  const lower = <T extends { height: Anatomy['back'] }>(fin: T): T => ({
    ...fin,
    height: fin.height.map(([t, h]) => [t, h * low]),
  });
  return {
    ...adult,
    back: shrink(adult.back.map(([x, y]) => [x, y - hump(x) * (1 - ease(0.35, 1, share))])),
    belly: shrink(adult.belly),
    gill: adult.gill * head,
    eye: { x: adult.eye.x * (1 + (eye - 1) * 0.32), y: adult.eye.y * (1 - (eye - 1) * 0.25), r: adult.eye.r * eye },
    dorsal: lower(adult.dorsal),
    anal: lower(adult.anal),
    pelvic: { ...adult.pelvic, length: adult.pelvic.length * low },
  };
}
