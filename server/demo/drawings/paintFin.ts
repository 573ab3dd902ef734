import type { Colouring, FinPaint, FinSpots } from './anatomy';
import { between, type Chance } from './chance';
import { colourAt, lit, mix } from './colour';
import { lerp, type Point, steps } from './curve';
import type { Fin } from './fins';
import { fill, line, oval, type Pen, ring, smoothRing, stroke } from './pen';

/** The strip of a fin between two heights, for t from start to end. Its sides follow the outermost rays. */
function strip(fin: Fin, low: number, high: number, start = 0, end = 1): Point[] {
  const ts = steps(fin.spines.length > 8 ? 64 : 28).map((share) => lerp(start, end, share));
  const side = (t: number, from: number, to: number) =>
    [0.2, 0.4, 0.6, 0.8].map((share) => fin.at(t, lerp(from, to, share) * fin.edge(t)));
  return [
    ...ts.map((t) => fin.at(t, low * fin.edge(t))),
    ...side(end, low, high),
    ...ts.reverse().map((t) => fin.at(t, high * fin.edge(t))),
    ...side(start, high, low),
  ];
}

const LAYERS = 7;

/** The membrane fades from its root to its edge along the fin, whatever its curve: thin layers, each shorter than the last. */
function membrane(pen: Pen, fin: Fin, paint: FinPaint): string[] {
  const left = (1 - paint.rootCover) / Math.max(0.02, 1 - paint.edgeCover);
  const layer = Math.max(0.1, 1 - Math.max(0.02, left) ** (1 / LAYERS));
  const layers = Array.from({ length: LAYERS }, (_, i) =>
    fill(ring(pen, strip(fin, -0.04, ((i + 1) / (LAYERS + 1)) ** 1.2)), paint.root, layer),
  );
  return [fill(ring(pen, strip(fin, -0.04, 1)), paint.edge, paint.edgeCover), ...layers];
}

/** A soft ray forks twice on its way out, as in life. */
function forked(fin: Fin, t: number, gap: number): Point[][] {
  const trunk = [0, 0.2, 0.45].map((s) => fin.at(t, s));
  const fork = (sideways: number, from: number, to: number): Point[] =>
    [0, 0.33, 0.66, 1].map((share) => {
      const s = lerp(from, to, share);
      return fin.at(Math.max(0, Math.min(1, t + sideways * gap * share)), s * 0.995);
    });
  return [trunk, fork(-0.2, 0.45, 1), fork(0.2, 0.45, 1), fork(-0.36, 0.62, 0.98), fork(0.36, 0.62, 0.98)];
}

function rays(pen: Pen, fin: Fin, paint: FinPaint): string[] {
  const width = pen.unit * 0.0018;
  const gap = 1 / Math.max(1, fin.rays.length + fin.spines.length);
  const soft = fin.rays.flatMap((t) => forked(fin, t, gap)).map((points) => line(pen, points));
  const hard = fin.spines.map((t) =>
    line(
      pen,
      [0, 0.3, 0.65, 1].map((s) => fin.at(t, s)),
    ),
  );
  return [
    soft.length > 0 ? stroke(soft.join(''), paint.rayColour, width, paint.rayCover) : '',
    hard.length > 0 ? stroke(hard.join(''), paint.rayColour, width * 1.5, Math.min(1, paint.rayCover * 1.25)) : '',
  ];
}

function spots(pen: Pen, fin: Fin, rows: FinSpots, chance: Chance): string[] {
  const made: string[] = [];
  const one = (t: number, s: number, size: number) => {
    const centre = fin.at(t, s * fin.edge(t));
    if (rows.ring) made.push(fill(smoothRing(pen, oval(centre, size * 1.45, size * 1.2)), rows.ring, rows.cover * 0.7));
    made.push(fill(smoothRing(pen, oval(centre, size, size * 0.85, 0, 12)), rows.colour, rows.cover));
  };
  for (let row = 0; row < rows.rows; row++) {
    for (let column = 0; column < rows.columns; column++) {
      const t = lerp(rows.t[0], rows.t[1], (column + (row % 2) * 0.5 + 0.25) / rows.columns);
      const s = lerp(rows.s[0], rows.s[1], (row + 0.5) / rows.rows);
      one(t + between(chance, -0.006, 0.006), s + between(chance, -0.02, 0.02), rows.size * between(chance, 0.8, 1.2));
    }
  }
  return made;
}

/** A fin with its membrane, bands, spots and rays. */
export function paintFin(pen: Pen, fin: Fin, paint: FinPaint, chance: Chance): string {
  const bands = (paint.bands ?? []).map((band) =>
    fill(ring(pen, strip(fin, band.from, band.to, band.start, band.end)), band.colour, band.cover),
  );
  const edge = line(
    pen,
    steps(72).map((t) => fin.at(t, fin.edge(t))),
  );
  return [
    ...membrane(pen, fin, paint),
    ...bands,
    ...(paint.spots ?? []).flatMap((rows) => spots(pen, fin, rows, chance)),
    ...rays(pen, fin, paint),
    stroke(edge, paint.rayColour, pen.unit * 0.0012, paint.rayCover * 0.7),
  ].join('');
}

/** Scales run out onto the tail: its root takes the colour of the body, and its rays begin under the skin. */
export function paintTailRoot(pen: Pen, tail: Fin, colours: Colouring): string {
  const sheath = [-0.02, 0.02, 0.06, 0.1, 0.15, 0.21, 0.28].map((reach) =>
    fill(
      ring(pen, strip(tail, -0.22 - reach, reach, 0.06, 0.94)),
      mix(lit(colourAt(colours.tones, 0.05), 0.85), colours.tail.root, 0.35),
      0.16,
    ),
  );
  const starts = tail.rays.map((t) => line(pen, [tail.at(t, -0.08), tail.at(t, 0.1), tail.at(t, 0.3)])).join('');
  return [...sheath, stroke(starts, colours.tail.rayColour, pen.unit * 0.0016, colours.tail.rayCover * 0.8)].join('');
}
