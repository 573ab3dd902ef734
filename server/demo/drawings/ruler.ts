import { linePath, smoothPath } from './curve';
import { fill, round, stroke } from './pen';

/** Figures as lines in a box 4 wide and 6 high, so that no font is needed. */
const FIGURES: readonly (readonly (readonly [number, number])[])[] = [
  [
    [2, 0],
    [0.4, 1.2],
    [0.1, 3],
    [0.4, 4.8],
    [2, 6],
    [3.6, 4.8],
    [3.9, 3],
    [3.6, 1.2],
    [2, 0],
  ],
  [
    [0.8, 1.2],
    [2.2, 0],
    [2.2, 3],
    [2.2, 6],
  ],
  [
    [0.2, 1.4],
    [1, 0.2],
    [2.6, 0],
    [3.7, 1.2],
    [3.2, 2.8],
    [0.2, 6],
    [3.9, 6],
  ],
  [
    [0.3, 0.7],
    [1.8, 0],
    [3.5, 0.9],
    [3.2, 2.5],
    [1.7, 2.9],
    [3.4, 3.4],
    [3.8, 4.8],
    [2, 6],
    [0.1, 5.2],
  ],
  [
    [3, 6],
    [3, 0],
    [0, 4.2],
    [4, 4.2],
  ],
  [
    [3.6, 0],
    [0.7, 0],
    [0.4, 2.8],
    [2.2, 2.2],
    [3.8, 3.6],
    [3, 5.7],
    [1.4, 6],
    [0.1, 5.2],
  ],
  [
    [3.4, 0.4],
    [1.6, 0.7],
    [0.3, 2.8],
    [0.3, 4.6],
    [1.8, 6],
    [3.6, 5],
    [3.4, 3.3],
    [1.8, 2.8],
    [0.4, 3.9],
  ],
  [
    [0.1, 0],
    [3.9, 0],
    [2.6, 2.6],
    [1.6, 6],
  ],
  [
    [2, 2.8],
    [0.6, 1.6],
    [2, 0],
    [3.4, 1.6],
    [2, 2.8],
    [0.2, 4.4],
    [2, 6],
    [3.8, 4.4],
    [2, 2.8],
  ],
  [
    [3.6, 2.1],
    [2.2, 3.2],
    [0.4, 2.4],
    [0.6, 0.7],
    [2.2, 0],
    [3.7, 1.2],
    [3.5, 3.4],
    [1.2, 6],
  ],
];
const STRAIGHT = new Set([1, 4, 7]);

function figureAt(value: number, x: number, y: number, unit: number): string {
  const points = (FIGURES[value] ?? []).map(([dx, dy]) => ({ x: x + dx * unit, y: y + dy * unit }));
  return STRAIGHT.has(value) ? linePath(points) : smoothPath(points);
}

function numberAt(value: number, x: number, y: number, unit: number): string {
  const figures = [...String(value)].map(Number);
  const left = x - (figures.length * 5.4 - 1.4) * unit * 0.5;
  return figures.map((figure, i) => figureAt(figure, left + i * 5.4 * unit, y, unit)).join('');
}

export type RulerPlace = { zeroX: number; topY: number; height: number; width: number; pxPerMm: number };

/** A printed strip: a line each millimetre, longer at five and ten, numbers at whole centimetres. Exact to scale. */
export function paintRuler({ zeroX, topY, height, width, pxPerMm }: RulerPlace): string {
  const lines: Record<'one' | 'five' | 'ten', string[]> = { one: [], five: [], ten: [] };
  const numbers: string[] = [];
  // Numbers of two figures must fit between centimetres.
  const unit = Math.min(height * 0.052, pxPerMm * 0.62);
  const last = Math.floor((width - zeroX) / pxPerMm);
  for (let mm = 0; mm <= last; mm++) {
    const x = round(zeroX + mm * pxPerMm);
    const kind = mm % 10 === 0 ? 'ten' : mm % 5 === 0 ? 'five' : 'one';
    const reach = { one: 0.2, five: 0.3, ten: 0.4 }[kind] * height;
    lines[kind].push(`M${x} ${round(topY)}v${round(reach)}`);
    if (kind === 'ten' && x < width - unit * 8) numbers.push(numberAt(mm / 10, x, topY + height * 0.5, unit));
  }
  const thin = Math.min(1.6, Math.max(0.9, pxPerMm * 0.12));
  return [
    fill(`M0 ${round(topY)}H${width}V${round(topY + height)}H0Z`, '#f1efe6'),
    fill(`M0 ${round(topY + height * 0.86)}H${width}V${round(topY + height)}H0Z`, '#dad7ca'),
    stroke(lines.one.join(''), '#1b1d1f', thin),
    stroke(lines.five.join(''), '#1b1d1f', thin * 1.1),
    stroke(lines.ten.join(''), '#1b1d1f', thin * 1.3),
    stroke(numbers.join(''), '#1b1d1f', Math.max(1.2, unit * 0.62)),
  ].join('');
}
