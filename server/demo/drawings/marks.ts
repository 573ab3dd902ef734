import type { Mark } from './anatomy';
import { type Body, flank } from './body';
import { between, type Chance } from './chance';
import { lerp, type Point, steps } from './curve';
import { line, oval, type Pen, ring, smoothRing, softly } from './pen';

/** The outline at a size: 1 is its own, other sizes make its soft edge. */
type Shape = (size: number) => Point[];
type Kind<K extends Mark['kind']> = Extract<Mark, { kind: K }>;

/** A bar whose edges waver a little, as in life; it narrows towards the belly by its taper. */
function bars(body: Body, mark: Kind<'bars'>, chance: Chance): Shape[] {
  return mark.at.map((x) => {
    const wide = mark.width * between(chance, 0.85, 1.15);
    const lean = between(chance, -0.008, 0.008);
    const phase = between(chance, 0, 6);
    const edge = (side: -1 | 1, size: number) =>
      steps(12).map((share) => {
        const half =
          ((size * wide) / 2) * (1 - (mark.taper ?? 0) * share) * (1 + 0.09 * Math.sin(9 * share + phase + side));
        const reach = mark.from + (mark.to - mark.from) * (0.5 + (share - 0.5) * (0.85 + 0.15 * size));
        return body.on(x + lean * share + side * half, reach);
      });
    return (size) => [...edge(-1, size), ...edge(1, size).reverse()];
  });
}

function stripe(body: Body, mark: Kind<'stripe'>, chance: Chance): Shape[] {
  const phase = between(chance, 0, 6);
  const edge = (side: -1 | 1, size: number) =>
    steps(26).map((share) => {
      const half =
        ((size * mark.height) / 2) * (1 + 0.16 * Math.sin(17 * share + phase + side)) * Math.min(1, 0.3 + 7 * share);
      return body.on(lerp(mark.from, mark.to, share), mark.v + side * half);
    });
  return [(size) => [...edge(-1, size), ...edge(1, size).reverse()]];
}

function spots(body: Body, mark: Kind<'spots'>, chance: Chance): Shape[] {
  const made: Shape[] = [];
  for (let row = 0; row < mark.rows; row++) {
    for (let column = 0; column < mark.columns; column++) {
      const x = lerp(mark.x[0], mark.x[1], (column + (row % 2) * 0.5) / mark.columns) + between(chance, -0.004, 0.004);
      const v = lerp(mark.v[0], mark.v[1], (row + 0.5) / mark.rows) + between(chance, -0.02, 0.02);
      const own = mark.size * between(chance, 0.7, 1.2);
      if (chance() > 0.08) made.push((size) => oval(body.on(x, v), size * own, size * own * 0.85, 0, 10));
    }
  }
  return made;
}

function blotches(body: Body, mark: Kind<'blotches'>, chance: Chance): Shape[] {
  return Array.from({ length: mark.count }, () => {
    const centre = body.on(between(chance, mark.x[0], mark.x[1]), between(chance, mark.v[0], mark.v[1]));
    const own = mark.size * between(chance, 0.35, 1.5);
    const phases = [between(chance, 0, 6), between(chance, 0, 6)];
    return (size) =>
      oval(centre, size * own, size * own, 0, 14).map((p, i) => {
        const wobble = 1 + 0.25 * Math.sin(i * 0.9 + (phases[0] ?? 0)) + 0.15 * Math.sin(i * 1.8 + (phases[1] ?? 0));
        return { x: lerp(centre.x, p.x, wobble), y: lerp(centre.y, p.y, wobble) };
      });
  });
}

function patch(body: Body, mark: Kind<'patch'>): Shape {
  return (size) =>
    steps(24).map((share) => {
      const angle = share * 2 * Math.PI;
      return body.on(mark.x + size * mark.rx * Math.cos(angle), mark.v + size * mark.rv * Math.sin(angle));
    });
}

function shapes(body: Body, mark: Mark, chance: Chance): Shape[] {
  switch (mark.kind) {
    case 'bars':
      return bars(body, mark, chance);
    case 'stripe':
      return stripe(body, mark, chance);
    case 'spots':
      return spots(body, mark, chance);
    case 'blotches':
      return blotches(body, mark, chance);
    case 'patch':
      return [patch(body, mark)];
  }
}

/** The pattern of the flank, in the order given. */
export function paintMarks(pen: Pen, body: Body, marks: readonly Mark[], chance: Chance): string {
  return marks
    .map((mark) => {
      const made = shapes(body, mark, chance);
      const straight = mark.kind === 'bars' || mark.kind === 'stripe';
      const draw = (points: Point[]) => (straight ? ring(pen, points) : smoothRing(pen, points));
      return softly(mark.soft, mark.colour, mark.cover, (size) => made.map((shape) => draw(shape(size))).join(''));
    })
    .join('');
}

export const outline = (pen: Pen, body: Body): string => ring(pen, flank(body, -1, 1));

/** The edges of back and belly, open where the body runs into the tail. */
export const edges = (pen: Pen, body: Body): string =>
  [-1, 1]
    .map((v) =>
      line(
        pen,
        body.xs.slice(0, -1).map((x) => body.on(x, v)),
      ),
    )
    .join('');
