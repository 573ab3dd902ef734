import { between, chanceOf } from './chance';
import { ease, type Point, point } from './curve';
import type { FishDescription } from './description';
import type { Pen } from './pen';

export type Placing = { key: string; x: number; y: number; unit: number; pose: FishDescription['pose']; tilt: number };

const RAD = Math.PI / 180;

/** Turned towards the lens the head is nearer and larger, the tail further and foreshortened. */
function turned(p: Point): Point {
  const near = 1 + 0.26 * (0.45 - p.x);
  return point(p.x * (0.86 - 0.1 * ease(0.3, 1, p.x)) + 0.03, p.y * near);
}

/** Places a fish whose snout (or tail, facing right) is at x and whose axis is at y. Without tilt it stays to scale. */
export function penFor({ key, x, y, unit, pose, tilt }: Placing): Pen {
  const middle = 0.4;
  const place = (p: Point): Point => {
    const q = pose === 'three-quarter' ? turned(p) : p;
    const [dx, dy] = [q.x - middle, q.y];
    const rx = middle + dx * Math.cos(tilt * RAD) - dy * Math.sin(tilt * RAD);
    const ry = dx * Math.sin(tilt * RAD) + dy * Math.cos(tilt * RAD);
    return point(x + (pose === 'right' ? 1 - rx : rx) * unit, y + ry * unit);
  };
  return { key, unit, place };
}

/** A free fish is never quite level. */
export function tiltOf(fish: FishDescription): number {
  if (fish.setting === 'box') return 0;
  const chance = chanceOf(`${fish.shot} tilt`);
  const lean = between(chance, -5, 5);
  return fish.pose === 'three-quarter' ? lean - 9 : lean;
}
