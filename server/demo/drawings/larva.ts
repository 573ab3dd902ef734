import type { Drawn } from './anatomy';
import { between, type Chance } from './chance';
import { colourAt, lit, mix } from './colour';
import { lerp, type Point, point, smoothPath, steps, through } from './curve';
import { fill, line, oval, type Pen, smoothRing, softly, stroke } from './pen';

const HALF_WIDTH = through([
  [0, 0.03],
  [0.05, 0.072],
  [0.13, 0.093],
  [0.24, 0.082],
  [0.4, 0.056],
  [0.62, 0.032],
  [0.8, 0.017],
  [0.88, 0.012],
]);

/** A fry seen from above, swimming with its tail to one side. */
export type Larva = { drawn: Drawn; yolk: boolean; bend: number };

export function paintLarva(pen: Pen, { drawn, yolk, bend }: Larva, chance: Chance): string {
  const spine = (x: number, aside: number): Point => point(x, aside + bend * 0.32 * Math.max(0, x - 0.25) ** 1.5);
  const skin = mix(colourAt(drawn.colours.juvenile.tones, -0.6), '#b9a27c', yolk ? 0.6 : 0.3);
  const xs = steps(20).map((share) => share * 0.88);
  const outline = (size: number) => [
    ...xs.map((x) => spine(x, -HALF_WIDTH(x) * size)),
    ...[...xs].reverse().map((x) => spine(x, HALF_WIDTH(x) * size)),
  ];
  const tail = [
    spine(0.78, -0.016),
    spine(0.93, -0.05),
    spine(1, -0.035),
    spine(0.985, 0),
    spine(1, 0.035),
    spine(0.93, 0.05),
    spine(0.78, 0.016),
  ];
  const paddle = (side: -1 | 1) => [
    spine(0.2, side * 0.07),
    spine(0.22, side * 0.16),
    spine(0.29, side * 0.185),
    spine(0.32, side * 0.13),
    spine(0.26, side * 0.07),
  ];
  const eye = (side: -1 | 1) => {
    const centre = spine(0.085, side * 0.07);
    return [
      fill(smoothRing(pen, oval(centre, 0.04, 0.036)), '#c9c4b0'),
      fill(smoothRing(pen, oval(spine(0.083, side * 0.076), 0.031, 0.03)), '#0b0b0d'),
      fill(smoothRing(pen, oval(spine(0.075, side * 0.07), 0.008, 0.008, 0, 8)), '#ffffff', 0.9),
    ].join('');
  };
  const dots = Array.from({ length: yolk ? 20 : 34 }, () => {
    const x = between(chance, 0.05, 0.82);
    const size = between(chance, 0.005, 0.013);
    return smoothRing(pen, oval(spine(x, HALF_WIDTH(x) * between(chance, -0.8, 0.8)), size, size * 0.8, 0, 8));
  });
  const sac = (size: number) => smoothRing(pen, oval(spine(0.28, 0), 0.15 * size, 0.125 * size));
  return [
    softly('wide', '#46525a', 0.3, (size) =>
      smoothRing(
        pen,
        outline(1.1 * size).map((p) => point(p.x + 0.02, p.y + 0.07)),
      ),
    ),
    yolk ? softly('soft', drawn.egg.colour, 0.95, sac) : '',
    yolk ? fill(smoothRing(pen, oval(spine(0.24, -0.07), 0.05, 0.025, -0.3)), '#fff4d4', 0.55) : '',
    fill(smoothRing(pen, tail), mix(skin, '#e8e2d4', 0.5), 0.45),
    stroke(line(pen, [spine(0.8, 0), spine(0.9, -0.01), spine(0.985, -0.02)]), '#6a6252', pen.unit * 0.004, 0.4),
    ...([-1, 1] as const).map((side) => fill(smoothRing(pen, paddle(side)), '#ece6da', 0.42)),
    ...steps(6).map((share) =>
      fill(smoothRing(pen, outline(lerp(1, 0.25, share))), lit(skin, lerp(0.72, 1.12, share)), yolk ? 0.8 : 0.95),
    ),
    fill(dots.join(''), '#2a221a', 0.5),
    stroke(
      line(
        pen,
        steps(10).map((share) => spine(lerp(0.14, 0.84, share), 0)),
      ),
      '#2a221a',
      pen.unit * 0.008,
      0.3,
    ),
    eye(-1),
    eye(1),
  ].join('');
}

/** One egg of a mouthbrooder: large, a little pear-shaped, amber. Length 1 in its own unit. */
export function paintEgg(pen: Pen, colour: string, chance: Chance): string {
  const fat = between(chance, 0.36, 0.41);
  const shape = (size: number, dx = 0, dy = 0) =>
    smoothRing(
      pen,
      oval(point(0.5 + dx, dy), 0.5 * size, fat * size, 0, 24).map((p) => point(p.x, p.y * (1 - 0.16 * (p.x - 0.5)))),
    );
  const layers = steps(9).map((share) =>
    fill(shape(1 - 0.72 * share, -0.1 * share, -0.1 * share), lit(colour, lerp(0.7, 1.22, share)), 0.9),
  );
  return [
    softly('wide', '#46525a', 0.32, (size) => shape(1.02 * size, 0.04, 0.12)),
    ...layers,
    softly('soft', '#8a4f1c', 0.28, (size) => smoothRing(pen, oval(point(0.66, 0.1), 0.16 * size, 0.07 * size, 0.6))),
    fill(smoothRing(pen, oval(point(0.34, -0.17), 0.1, 0.045, -0.4)), '#ffffff', 0.75),
    stroke(
      smoothPath(oval(point(0.5, 0), 0.495, fat * 0.99, 0, 24).map(pen.place), true),
      '#6a3f16',
      pen.unit * 0.012,
      0.3,
    ),
  ].join('');
}
