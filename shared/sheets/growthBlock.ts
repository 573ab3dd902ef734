import { addMonths, daysBetween } from '../days';
import type { Block } from '../print/flow';
import { CAP_HEIGHT, word } from '../print/lines';
import { widthOf } from '../print/measure';
import { box, type Mark, type Point, rule } from '../print/page';
import { TENTHS_MM_PER, type UnitChoices } from '../units';
import { formatLength } from '../unitWords';
import type { Growth, LengthSample } from './husbandry';
import { plain, type Setting, smallText } from './parts';
import { daysWords } from './sayings';

const TYPE_MM = 3.17;
const AXIS_MM = 8;
const FOOT_MM = 6;
/** Room for half a figure above the highest grid line. */
const TOP_MM = 2.8;
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;
const MOST_LINES = 7;

type Scale = { x(day: string): number; y(mm: number): number };
type Frame = { widthMm: number; heightMm: number };

/** Right side of the section's head: what was measured, and its unit. */
export const growthSide = (growth: Growth, units: UnitChoices): string =>
  `mean ${growth.measure} length, ${units.length}`;

/** Lengths as measured, box and tick for each sample; a curve only between them. */
export function growthBlock(growth: Growth, widthMm: number, setting: Setting, units: UnitChoices): Block {
  const caption = smallText(plain(captionOf(growth)), widthMm);
  const chart = setting.chartMm;
  return {
    heightMm: TOP_MM + chart + caption.heightMm,
    marks: (x, y) => [
      ...chartMarks(growth, { x, y: y + TOP_MM }, { widthMm, heightMm: chart }, units),
      ...caption.marks(x, y + TOP_MM + chart),
    ],
  };
}

function captionOf({ samples, fitted }: Growth): string {
  const sizes = samples.map(({ n }) => n);
  const [least, most] = [Math.min(...sizes), Math.max(...sizes)];
  const fish = least === most ? `${most} fish` : `${least} to ${most} fish`;
  const when = daysWords(samples[0]?.on ?? '', samples.at(-1)?.on ?? '');
  const count = samples.length === 1 ? `One sample of ${fish}` : `${samples.length} samples of ${fish}`;
  const spread = samples.some(({ sdMm }) => sdMm !== null) ? ' Box: mean ± 1 SD.' : '';
  return `${count}, ${when}.${spread}${fitted ? ' Curve: fitted to them.' : ''}`;
}

/** The step between grid lines: 1, 2 or 5 of a power of ten, at most seven lines. */
function stepFor(top: number): number {
  for (let power = -1; ; power += 1) {
    for (const digit of [1, 2, 5]) if (top / (digit * 10 ** power) <= MOST_LINES - 1) return digit * 10 ** power;
  }
}

function chartMarks(growth: Growth, at: { x: number; y: number }, frame: Frame, units: UnitChoices): Mark[] {
  const perUnit = TENTHS_MM_PER[units.length] / 10;
  const highest = Math.max(...growth.samples.map(({ meanMm, sdMm }) => meanMm + (sdMm ?? 0)));
  const step = stepFor(highest / perUnit);
  const lines = Math.ceil(highest / perUnit / step - 1e-9);
  const first = growth.samples[0]?.on ?? '';
  const span = Math.max(14, daysBetween(first, growth.samples.at(-1)?.on ?? first));
  const last = growth.samples.at(-1);
  const label = last ? formatLength(last.meanMm * 10, units) : '';
  // The last figure stands right of its box, inside the frame.
  const right = widthOf(label, 'bold', 3.44) + 3.5;
  const [plotWidth, plotHeight] = [frame.widthMm - AXIS_MM - right - 1, frame.heightMm - FOOT_MM];
  const scale: Scale = {
    x: (day) => at.x + AXIS_MM + 1 + (daysBetween(first, day) / span) * plotWidth,
    y: (mm) => at.y + plotHeight * (1 - mm / perUnit / (lines * step)),
  };
  const decimals = step < 1 ? 1 : 0;
  return [
    ...Array.from({ length: lines + 1 }, (_, i) =>
      gridLine(i, (i * step).toFixed(decimals), at.x, scale.y(i * step * perUnit), frame),
    ).flat(),
    ...monthMarks({ first, span }, scale, { y: at.y + plotHeight, right: at.x + frame.widthMm }),
    ...curveMarks(growth, scale),
    ...growth.samples.flatMap((sample) => sampleMarks(sample, scale)),
    ...(last
      ? [word(label, { x: scale.x(last.on) + 2.8, y: scale.y(last.meanMm) + 1.2, sizeMm: 3.44, face: 'bold' })]
      : []),
  ];
}

function gridLine(index: number, text: string, x: number, y: number, frame: Frame): Mark[] {
  return [
    word(text, {
      x: x + AXIS_MM - 2.2,
      y: y + (TYPE_MM * CAP_HEIGHT) / 2,
      sizeMm: TYPE_MM,
      ink: 'ink2',
      anchor: 'end',
    }),
    rule(x + AXIS_MM, y, frame.widthMm - AXIS_MM, 0.26, index === 0 ? 'control' : 'ruleSoft'),
  ];
}

/** A tick at the first of a month; names stand right of their ticks, January with its year, as many as fit. */
function monthMarks(time: { first: string; span: number }, scale: Scale, foot: { y: number; right: number }): Mark[] {
  const every = [1, 2, 3, 6, 12, 24, 60].find((months) => (time.span / 30.4 / months) * 13 < 80) ?? 120;
  const marks: Mark[] = [];
  const january = `${time.first.slice(0, 4)}-01-01`;
  for (let i = 0; i < 12 * 60; i += every) {
    const day = addMonths(january, i);
    if (daysBetween(time.first, day) > time.span) break;
    if (day < time.first) continue;
    const text =
      every >= 12 || day.slice(5, 7) === '01' ? day.slice(0, 4) : (MONTHS[Number(day.slice(5, 7)) - 1] ?? '');
    const x = scale.x(day);
    marks.push({
      kind: 'line',
      points: [
        [x, foot.y],
        [x, foot.y + 1.3],
      ],
      widthMm: 0.26,
      ink: 'control',
    });
    const fits = x + 0.6 + widthOf(text, 'regular', TYPE_MM) <= foot.right;
    if (fits) marks.push(word(text, { x: x + 0.6, y: foot.y + 4.4, sizeMm: TYPE_MM, ink: 'ink2' }));
  }
  return marks;
}

function curveMarks({ fitted }: Growth, scale: Scale): Mark[] {
  if (!fitted) return [];
  const points = fitted.points.map(({ on, meanMm }): Point => [scale.x(on), scale.y(meanMm)]);
  return [{ kind: 'line', points, widthMm: 0.6, ink: 'curve' }];
}

function sampleMarks({ on, meanMm, sdMm }: LengthSample, scale: Scale): Mark[] {
  const [x, y] = [scale.x(on), scale.y(meanMm)];
  const sd = sdMm ?? 0;
  const [top, bottom] = [scale.y(meanMm + sd), scale.y(Math.max(0, meanMm - sd))];
  const spread: Mark[] =
    sd > 0
      ? [
          {
            kind: 'area',
            points: box(x - 0.7, top, 1.4, bottom - top),
            fill: 'paper',
            stroke: { widthMm: 0.33, ink: 'ink2' },
          },
        ]
      : [];
  return [...spread, rule(x - 1.5, y, 3, 0.75, 'ink')];
}

/** Said in place of a chart. */
export const NO_LENGTHS = 'No lengths have been measured.';
