import { between, type Chance, chanceOf } from './chance';
import { lit, mix } from './colour';
import { linePath, type Point, point, smoothPath, steps } from './curve';
import { fill, glow, oval, round, softly } from './pen';

/** What a species is kept over. */
export type Scenery = { water: readonly [string, string]; rock: string; rocks: number; sand: string; floor: number };

const TANGANYIKA: readonly [string, string] = ['#4f8fa0', '#0f3342'];
const MALAWI: readonly [string, string] = ['#4c87b0', '#0d2b4a'];

export const ROCKY: Scenery = { water: TANGANYIKA, rock: '#6c6a5c', rocks: 6, sand: '#a8977a', floor: 0.84 };
export const SANDY: Scenery = { water: TANGANYIKA, rock: '#7a7563', rocks: 1, sand: '#cbb993', floor: 0.72 };
export const OPEN: Scenery = { water: ['#4b88a8', '#0b2a40'], rock: '#55605f', rocks: 2, sand: '#8f8a76', floor: 0.93 };
export const REEF: Scenery = { water: MALAWI, rock: '#6f685e', rocks: 6, sand: '#b9aa8a', floor: 0.85 };

type Frame = { w: number; h: number };

function boulder(frame: Frame, chance: Chance, scenery: Scenery, near: number): string {
  const centre = point(
    frame.w * between(chance, -0.05, 1.05),
    frame.h * (scenery.floor - between(chance, -0.05, 0.14) * near),
  );
  const rx = frame.w * between(chance, 0.12, 0.27) * near;
  const ry = frame.h * between(chance, 0.15, 0.34) * near;
  const phases = [0, 1, 2].map(() => between(chance, 0, 6.3));
  const outline = (size: number, lift: number): Point[] =>
    oval(point(centre.x - lift * rx * 0.12, centre.y - lift * ry), rx * size, ry * size, 0, 22).map((p, i) => {
      const angle = (i / 22) * 2 * Math.PI;
      const bumpy = 1 + 0.1 * Math.sin(2 * angle + (phases[0] ?? 0)) + 0.06 * Math.sin(5 * angle + (phases[1] ?? 0));
      return point(centre.x + (p.x - centre.x) * bumpy, centre.y + (p.y - centre.y) * bumpy);
    });
  const tone = mix(lit(scenery.rock, between(chance, 0.8, 1.3)), scenery.water[1], 0.74 - 0.44 * near);
  const rough = (count: number, low: number, high: number) =>
    Array.from({ length: count }, () => {
      const angle = between(chance, 0, 6.28);
      const out = Math.sqrt(chance()) * 0.82;
      const p = point(centre.x + rx * out * Math.cos(angle), centre.y + ry * out * Math.sin(angle));
      const size = rx * between(chance, low, high);
      return smoothPath(oval(p, size, size * between(chance, 0.35, 0.7), between(chance, -0.6, 0.6), 10), true);
    }).join('');
  const layers = steps(22).map((share) =>
    fill(smoothPath(outline(1 - 0.62 * share, 0.42 * share), true), lit(tone, 0.6 + 0.8 * share), 0.6),
  );
  return [
    ...layers,
    fill(rough(26, 0.04, 0.16), lit(tone, 0.6), 0.22),
    fill(rough(20, 0.03, 0.12), lit(mix(tone, '#7c8a4e', 0.4), 1.5), 0.2),
  ].join('');
}

function rays(frame: Frame, chance: Chance): string {
  return Array.from({ length: 5 }, () => {
    const x = frame.w * between(chance, -0.1, 0.9);
    const wide = frame.w * between(chance, 0.03, 0.09);
    const lean = frame.w * between(chance, 0.08, 0.16);
    const ray = (size: number) =>
      linePath(
        [point(x, 0), point(x + wide * size, 0), point(x + lean + wide * 2 * size, frame.h), point(x + lean, frame.h)],
        true,
      );
    return softly('soft', '#d6f4f4', between(chance, 0.05, 0.12), ray);
  }).join('');
}

function sand(frame: Frame, chance: Chance, scenery: Scenery): string {
  const top = frame.h * scenery.floor;
  const crest = steps(12).map((share) =>
    point(frame.w * share, top + frame.h * 0.012 * Math.sin(share * 9 + chance())),
  );
  const ground = linePath([...crest, point(frame.w, frame.h), point(0, frame.h)], true);
  const far = mix(scenery.sand, scenery.water[1], 0.36);
  const near = mix(scenery.sand, scenery.water[1], 0.12);
  return [
    `<linearGradient id="sand" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="${far}"/>`,
    `<stop offset="0.5" stop-color="${near}"/><stop offset="1" stop-color="${lit(near, 0.8)}"/></linearGradient>`,
    fill(ground, 'url(#sand)'),
  ].join('');
}

/** Water, light from above, rocks and sand, as a lens focused on the fish would leave them. */
export function paintTank(frame: Frame, scenery: Scenery, shot: string): string {
  const chance = chanceOf(`${shot} tank`);
  const far = Array.from({ length: scenery.rocks }, () => boulder(frame, chance, scenery, between(chance, 0.55, 0.8)));
  const near = Array.from({ length: Math.ceil(scenery.rocks / 3) }, () => boulder(frame, chance, scenery, 1));
  return [
    `<linearGradient id="deep" x1="0" y1="0" x2="0.15" y2="1"><stop offset="0" stop-color="${scenery.water[0]}"/>`,
    `<stop offset="0.55" stop-color="${mix(scenery.water[0], scenery.water[1], 0.62)}"/><stop offset="1" stop-color="${scenery.water[1]}"/></linearGradient>`,
    fill(`M0 0H${frame.w}V${frame.h}H0Z`, 'url(#deep)'),
    glow(
      'surface',
      { x: frame.w * between(chance, 0.3, 0.7), y: -frame.h * 0.12, rx: frame.w * 0.85, ry: frame.h * 0.75 },
      '#d9f3f2',
      0.62,
    ),
    rays(frame, chance),
    ...far,
    fill(`M0 0H${frame.w}V${round(frame.h)}H0Z`, mix(scenery.water[0], scenery.water[1], 0.5), 0.22),
    ...near,
    sand(frame, chance, scenery),
  ].join('');
}

/** Grains of the sand near the lens: smaller and closer towards its far edge. */
function grains(frame: Frame, chance: Chance, colour: string, top: number): string {
  const dots = Array.from({ length: 420 }, () => {
    const deep = 0.12 + 0.88 * chance() ** 0.8;
    const size = frame.h * (0.0008 + 0.0024 * deep) * between(chance, 0.6, 1.3);
    return linePath(oval(point(frame.w * chance(), top + (frame.h - top) * deep), size, size * 0.6, 0, 6), true);
  });
  return fill(dots.join(''), colour, 0.34);
}

/** Sand in focus, specks adrift in the water and the dark towards the corners. */
export function paintWaterBefore(frame: Frame, scenery: Scenery, shot: string): string {
  const chance = chanceOf(`${shot} motes`);
  const top = frame.h * (scenery.floor + 0.02);
  const motes = Array.from({ length: 26 }, () => {
    const size = frame.h * between(chance, 0.0008, 0.0022);
    return linePath(oval(point(frame.w * chance(), frame.h * chance()), size, size, 0, 6), true);
  });
  return [
    '<radialGradient id="corners" cx="0.5" cy="0.48" r="0.75"><stop offset="0.55" stop-color="#000814" stop-opacity="0"/>',
    '<stop offset="1" stop-color="#000814" stop-opacity="0.42"/></radialGradient>',
    grains(frame, chance, lit(scenery.sand, 1.2), top),
    grains(frame, chance, lit(scenery.sand, 0.4), top),
    fill(motes.join(''), '#e6f6f4', 0.35),
    fill(`M0 0H${frame.w}V${frame.h}H0Z`, 'url(#corners)'),
  ].join('');
}
