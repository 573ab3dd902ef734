import { linePath, type Point, smoothPath } from './curve';

/** Puts points of the fish onto the picture. `unit` is the total length in pixels, for widths of lines and blurs. */
export type Pen = { key: string; unit: number; place: (p: Point) => Point };

export const ring = (pen: Pen, points: readonly Point[]): string => linePath(points.map(pen.place), true);
export const smoothRing = (pen: Pen, points: readonly Point[]): string => smoothPath(points.map(pen.place), true);
export const line = (pen: Pen, points: readonly Point[]): string => smoothPath(points.map(pen.place));

export const fill = (d: string, colour: string, cover = 1): string =>
  `<path d="${d}" fill="${colour}"${cover < 1 ? ` fill-opacity="${round(cover)}"` : ''}/>`;

export const stroke = (d: string, colour: string, width: number, cover = 1): string =>
  `<path d="${d}" fill="none" stroke="${colour}" stroke-width="${round(width)}" stroke-linecap="round" stroke-linejoin="round"${
    cover < 1 ? ` stroke-opacity="${round(cover)}"` : ''
  }/>`;

/** Up to three places after the point: finer than any pixel, short enough to keep pictures small. */
export const round = (value: number): number => Math.round(value * 1000) / 1000;

/** An ellipse as points, so that it bends with the fish. */
export function oval(centre: Point, rx: number, ry: number, turn = 0, n = 24): Point[] {
  return Array.from({ length: n }, (_, i) => {
    const angle = (i / n) * 2 * Math.PI;
    const [x, y] = [rx * Math.cos(angle), ry * Math.sin(angle)];
    return {
      x: centre.x + x * Math.cos(turn) - y * Math.sin(turn),
      y: centre.y + x * Math.sin(turn) + y * Math.cos(turn),
    };
  });
}

/** How far the soft edge of a shape reaches out and in, as a share of its size, and in how many layers. */
const FEATHER = { crisp: { reach: 0, layers: 1 }, soft: { reach: 0.36, layers: 5 }, wide: { reach: 0.62, layers: 11 } };
export type Softness = keyof typeof FEATHER;

const layerCover = (cover: number, layers: number): number => 1 - (1 - Math.min(cover, 0.995)) ** (1 / layers);

/** A shape with a soft edge, as layers of the same shape from large to small: much cheaper to paint than a blur. */
export function softly(soft: Softness, colour: string, cover: number, shape: (size: number) => string): string {
  const { reach, layers } = FEATHER[soft];
  const each = layerCover(cover, layers);
  return Array.from({ length: layers }, (_, i) =>
    fill(shape(1 + reach * (1 - (2 * (i + 0.5)) / layers)), colour, each),
  ).join('');
}

/** A line with a soft edge, `width` wide at half its strength. */
export function softStroke(d: string, colour: string, width: number, cover: number, layers = 5): string {
  const each = layerCover(cover, layers);
  return Array.from({ length: layers }, (_, i) =>
    stroke(d, colour, (2 * width * (layers - i)) / (layers + 1), each),
  ).join('');
}

/** A round glow that fades to nothing, smooth at any size. */
export function glow(
  id: string,
  at: { x: number; y: number; rx: number; ry: number },
  colour: string,
  cover: number,
): string {
  const stops = [1, 0.82, 0.55, 0.28, 0.1, 0].map(
    (share, i) => `<stop offset="${i / 5}" stop-color="${colour}" stop-opacity="${round(cover * share)}"/>`,
  );
  return [
    `<radialGradient id="${id}">${stops.join('')}</radialGradient>`,
    `<ellipse cx="${round(at.x)}" cy="${round(at.y)}" rx="${round(at.rx)}" ry="${round(at.ry)}" fill="url(#${id})"/>`,
  ].join('');
}
