import type { Colouring } from './anatomy';
import { type Body, flank } from './body';
import type { Chance } from './chance';
import { colourAt, lit } from './colour';
import { clamp, ease, lerp, type Point } from './curve';
import { fill, line, type Pen, ring, softly, stroke } from './pen';

const LEVELS = 36;

/** The round body under light from above and in front, as thin bands that follow its form. */
export function paintSkin(pen: Pen, body: Body, colours: Colouring): string {
  return Array.from({ length: LEVELS }, (_, i) => {
    const upper = lerp(-1, 1, i / LEVELS);
    const v = upper + 1 / LEVELS;
    const round = 0.7 + 0.36 * Math.sqrt(Math.max(0, 1 - 0.96 * v * v));
    const above = 1 - 0.1 * v;
    const glow = 0.06 * Math.exp(-(((v + 0.45) / 0.18) ** 2));
    // Each band reaches down to the belly, under the next: no seams show.
    return fill(ring(pen, flank(body, upper, 1)), lit(colourAt(colours.tones, v), round * above + glow));
  }).join('');
}

type Scale = { points: Point[]; x: number };

function scalesOf(body: Body): Scale[] {
  const { scales, gill, standard } = body.anatomy;
  const width = (standard - gill) / scales.columns;
  const made: Scale[] = [];
  for (let row = 0; row < scales.rows; row++) {
    const v = lerp(-0.95, 0.93, (row + 0.5) / scales.rows);
    const tall = 1.9 / scales.rows;
    // Rows start behind the gill cover, which curves; above it they run on to the nape.
    const start = gill - (v < -0.55 ? (-0.55 - v) * 0.26 : 0) - 0.03 * Math.abs(v - 0.05);
    for (let x = start + (row % 2) * width * 0.5; x < standard - 0.005; x += width) {
      const hind = x + width * 0.95;
      made.push({
        x,
        points: [
          body.on(x + width * 0.12, v - tall * 0.62),
          body.on(hind - width * 0.22, v - tall * 0.38),
          body.on(hind, v),
          body.on(hind - width * 0.22, v + tall * 0.38),
          body.on(x + width * 0.12, v + tall * 0.62),
        ],
      });
    }
  }
  return made;
}

/** Hind edges of the scales, dark outside and light within, and a sparkle on some of them. */
export function paintScales(pen: Pen, body: Body, colours: Colouring, chance: Chance): string {
  const scales = scalesOf(body);
  const width = pen.unit * 0.0021;
  const dark = scales.map(({ points }) => line(pen, points));
  const inward = scales.map(({ points }) =>
    line(
      pen,
      points.map((p) => ({ x: p.x - 0.0035, y: p.y })),
    ),
  );
  const bright: string[] = [];
  const dim: string[] = [];
  for (const { points } of scales) {
    const luck = chance();
    if (luck < 0.28) bright.push(ring(pen, points));
    else if (luck > 0.74) dim.push(ring(pen, points));
  }
  return [
    fill(bright.join(''), colours.sparkle, colours.sparkleCover),
    fill(dim.join(''), '#0a0c10', colours.scaleEdge * 0.22),
    stroke(dark.join(''), '#0b0a0c', width, colours.scaleEdge),
    stroke(inward.join(''), colours.sparkle, width * 0.8, colours.sparkleCover * 0.8),
  ].join('');
}

/** The lateral line of a cichlid is in two parts: one high in front, one along the middle of the tail. */
export function paintLateralLine(pen: Pen, body: Body): string {
  const { gill, standard } = body.anatomy;
  const pores: string[] = [];
  const dash = (x: number, v: number) => pores.push(line(pen, [body.on(x, v), body.on(x + 0.007, v + 0.004)]));
  const end = gill + (standard - gill) * 0.72;
  for (let x = gill + 0.012; x < end; x += 0.0155) {
    dash(x, lerp(-0.36, -0.5, ease(gill, gill + 0.2, x)) + 0.12 * ease(end - 0.16, end, x));
  }
  for (let x = gill + (standard - gill) * 0.6; x < standard - 0.01; x += 0.0155) dash(x, 0.03);
  return stroke(pores.join(''), '#0c0b0d', pen.unit * 0.0028, 0.34);
}

/** Light on the upper flank and shade under the belly, over the pattern. */
export function paintLight(pen: Pen, body: Body): string {
  const { standard } = body.anatomy;
  const band = (from: number, to: number, v: number, tall: number) => (size: number) => {
    const xs = Array.from({ length: 24 }, (_, i) => lerp(from, to, i / 23));
    const half = (x: number) => size * tall * Math.sin(Math.PI * clamp((x - from) / (to - from), 0, 1)) ** 0.6;
    return ring(pen, [...xs.map((x) => body.on(x, v - half(x))), ...xs.reverse().map((x) => body.on(x, v + half(x)))]);
  };
  return [
    softly('wide', '#ffffff', 0.13, band(0.03, standard - 0.02, -0.52, 0.22)),
    softly('wide', '#05070b', 0.3, band(0.06, standard, 1, 0.26)),
  ].join('');
}
