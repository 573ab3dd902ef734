import type { Colouring } from './anatomy';
import type { Body } from './body';
import { lit, mix } from './colour';
import { lerp, type Point, point, steps } from './curve';
import { fill, line, oval, type Pen, ring, round, smoothRing, softly, softStroke, stroke } from './pen';

const GILL_EDGE: readonly (readonly [number, number])[] = [
  [-0.058, -0.5],
  [-0.026, -0.4],
  [-0.006, -0.22],
  [0.003, -0.02],
  [-0.006, 0.2],
  [-0.03, 0.46],
  [-0.066, 0.7],
  [-0.115, 0.88],
  [-0.17, 0.97],
];

const CHEEK_EDGE: readonly (readonly [number, number])[] = [
  [-0.085, -0.3],
  [-0.074, 0.05],
  [-0.082, 0.36],
  [-0.115, 0.6],
  [-0.165, 0.72],
];

/** Gill cover, cheek and throat. */
export function paintGill(pen: Pen, body: Body, holding: boolean): string {
  const { gill } = body.anatomy;
  const edge = (knots: typeof GILL_EDGE, shift = 0) =>
    knots.map(([x, v]) => body.on(gill + (x * gill) / 0.28 + shift, v));
  const cover = [...edge(GILL_EDGE), ...edge(CHEEK_EDGE).reverse()];
  const throat = [0.02, 0.06, 0.1].map((up) =>
    line(
      pen,
      [0.35, 0.55, 0.75, 0.95].map((share) => body.on(gill * share, 0.97 - up * 2.4 * Math.sin(Math.PI * share))),
    ),
  );
  return [
    fill(smoothRing(pen, cover), '#ffffff', 0.07),
    softStroke(line(pen, edge(GILL_EDGE, 0.008)), '#04060a', pen.unit * 0.011, 0.25),
    softStroke(line(pen, edge(CHEEK_EDGE, 0.006)), '#04060a', pen.unit * 0.008, 0.17),
    stroke(line(pen, edge(GILL_EDGE)), '#04060a', pen.unit * 0.0022, 0.36),
    stroke(line(pen, edge(GILL_EDGE, -0.004)), '#ffffff', pen.unit * 0.002, 0.13),
    holding ? stroke(throat.join(''), '#fff4e0', pen.unit * 0.0022, 0.3) : '',
  ].join('');
}

/** Lips, the line of the mouth and the nostril. The upper lip is the foremost point of the fish: x = 0. */
export function paintMouth(pen: Pen, body: Body, colours: Colouring): string {
  const { mouth, eye } = body.anatomy;
  const gape = steps(8).map((share) => point(0.001 + mouth.length * share, mouth.y + mouth.drop * share ** 1.3));
  const lip = (side: -1 | 1): Point[] => {
    const away = steps(10).map((share) => {
      const thick = mouth.lip * Math.sqrt(Math.sin(Math.PI * (0.12 + 0.86 * share)));
      return point(
        mouth.length * 0.95 * share + (side < 0 ? 0 : 0.004),
        mouth.y + mouth.drop * share ** 1.3 + side * thick,
      );
    });
    return [...away, ...[...gape].reverse()];
  };
  const nostril = point(lerp(0.03, eye.x, 0.55), lerp(body.on(lerp(0.03, eye.x, 0.55), -1).y, eye.y, 0.5));
  return [
    fill(smoothRing(pen, lip(1)), lit(colours.lips, 0.82)),
    fill(smoothRing(pen, lip(-1)), colours.lips),
    stroke(line(pen, lip(-1).slice(0, 11)), '#05070b', pen.unit * 0.0016, 0.35),
    stroke(line(pen, lip(1).slice(0, 11)), '#05070b', pen.unit * 0.0016, 0.35),
    stroke(line(pen, gape.slice(1)), '#06070a', pen.unit * 0.0036, 0.85),
    fill(ring(pen, oval(nostril, 0.0055, 0.0035, -0.5)), '#05060a', 0.6),
  ].join('');
}

/** Shade round the eye, small scales of cheek and gill cover, and the pores under the eye. */
export function paintCheek(pen: Pen, body: Body, colours: Colouring): string {
  const { gill, eye } = body.anatomy;
  const scales: string[] = [];
  const size = gill * 0.05;
  for (let row = 0; row < 11; row++) {
    for (let column = 0; column < 11; column++) {
      const x = gill * (0.4 + 0.05 * (column + (row % 2) / 2));
      const v = -0.42 + row * 0.115;
      const p = body.on(x, v);
      if (Math.hypot(p.x - eye.x, p.y - eye.y) < eye.r * 1.5 || x > gill * (0.97 - 0.35 * Math.max(0, v))) continue;
      scales.push(
        line(pen, [point(p.x, p.y - size * 0.6), point(p.x + size * 0.55, p.y), point(p.x, p.y + size * 0.6)]),
      );
    }
  }
  const pores = steps(6).map((share) => {
    const angle = lerp(2.7, 0.3, share);
    return ring(
      pen,
      oval(point(eye.x + eye.r * 1.55 * Math.cos(angle), eye.y + eye.r * 1.6 * Math.sin(angle)), 0.0022, 0.0022, 0, 8),
    );
  });
  return [
    softly('soft', '#05060a', 0.34, (size) =>
      smoothRing(pen, oval(point(eye.x, eye.y), eye.r * 1.14 * size, eye.r * 1.14 * size)),
    ),
    stroke(scales.join(''), '#08080c', pen.unit * 0.0015, colours.scaleEdge * 0.42),
    fill(pores.join(''), '#050609', 0.4),
  ].join('');
}

/** The eye: socket, rim, iris, a pupil drawn out a little forwards, and the lamp in it. */
export function paintEye(pen: Pen, body: Body, colours: Colouring): string {
  const { x, y, r } = body.anatomy.eye;
  const id = `${pen.key}-iris`;
  const centre = point(x, y);
  const disc = (size: number, dx = 0, dy = 0, tall = 1) =>
    smoothRing(pen, oval(point(x + dx, y + dy), size, size * tall));
  const arc = (size: number, from: number, to: number) => line(pen, oval(centre, size, size, 0, 32).slice(from, to));
  const lamp = point(x - r * 0.2, y - r * 0.32);
  const c = pen.place(centre);
  return [
    `<radialGradient id="${id}" gradientUnits="userSpaceOnUse" cx="${round(c.x)}" cy="${round(c.y)}" r="${round(r * pen.unit)}">`,
    `<stop offset="0.6" stop-color="${mix(colours.iris, '#fff6d8', 0.35)}"/><stop offset="0.68" stop-color="${lit(colours.iris, 0.92)}"/>`,
    `<stop offset="0.88" stop-color="${mix(colours.iris, colours.irisRim, 0.6)}"/><stop offset="1" stop-color="${lit(colours.irisRim, 0.6)}"/></radialGradient>`,
    fill(disc(r * 1.03), mix(colours.irisRim, '#0a0a0c', 0.75)),
    fill(disc(r * 0.96), `url(#${id})`),
    fill(smoothRing(pen, oval(point(x - r * 0.04, y + r * 0.01), r * 0.64, r * 0.6)), '#040507'),
    softStroke(arc(r * 0.8, 18, 31), '#08080a', pen.unit * r * 0.2, 0.5, 3),
    softStroke(arc(r * 0.84, 3, 12), '#ffffff', pen.unit * r * 0.08, 0.22, 3),
    softly('soft', '#86a8c8', 0.2, (size) => disc(r * 0.34 * size, r * 0.06, r * 0.26, 0.5)),
    softly('soft', '#ffffff', 0.95, (size) => smoothRing(pen, oval(lamp, r * 0.13 * size, r * 0.1 * size, -0.5))),
  ].join('');
}
