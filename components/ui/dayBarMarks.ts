/** What one bar of the day-bars tells; `shared/holds/dayBars` makes them. */
export type DayBar = {
  day: number;
  when: 'past' | 'today' | 'ahead';
  stage: 'egg' | 'wriggler' | 'fry' | 'guarded';
  /** Before she was first seen holding. */
  unseen: boolean;
  strip: boolean;
  /** The female may pass the young to the male. */
  handOver: boolean;
  release: boolean;
  expected: boolean;
  checked: boolean;
};

type Ink = 'egg' | 'wriggler' | 'fry' | 'ink' | 'control' | 'band';

/** A rectangle to draw: filled, outlined, or outlined in dashes. */
export type DayMark = {
  key: string;
  x: number;
  y: number;
  width: number;
  height: number;
  ink: Ink;
  look: 'fill' | 'line' | 'dashed';
};

export type DayBarSize = 'row' | 'page' | 'calendar';

/** Heights in px: bars, what today rises above and below them, and the room on top for checks. */
export const daySizes: Record<
  DayBarSize,
  { bar: number; rise: number; fall: number; band: number; gap: number; top: number }
> = {
  row: { bar: 24, rise: 6, fall: 4, band: 4, gap: 2.4, top: 4 },
  page: { bar: 66, rise: 12, fall: 8, band: 4, gap: 3, top: 0 },
  calendar: { bar: 34, rise: 5, fall: 5, band: 5, gap: 2, top: 10 },
};

const CHECK = 4;
const SHORT = 0.36;

/** Height of the picture without its words. */
export function dayBarsHeight(size: DayBarSize): number {
  const { bar, rise, fall, top } = daySizes[size];
  return top + rise + bar + fall;
}

/** The widest a day is drawn: on a wide screen the bars stay bars. */
const widestDay: Record<DayBarSize, number> = { row: 12, page: 20, calendar: 12 };

/** How much of the width there is the bars take. */
export const dayBarsWidth = (count: number, width: number, size: DayBarSize): number =>
  Math.min(width, count * widestDay[size]);

/** Every mark of the day-bars on a field `width` px wide, bands first. */
export function dayBarMarks(bars: readonly DayBar[], width: number, size: DayBarSize): DayMark[] {
  if (bars.length === 0 || width <= 0) return [];
  const gap = Math.min(daySizes[size].gap, (width / bars.length) * 0.33);
  const step = (width + gap) / bars.length;
  return [
    ...windowMark(bars, step, gap, size),
    ...bars.flatMap((bar, i) => marksOf(bar, i * step, step - gap, size)),
    ...underlines(bars, step, gap, size),
  ];
}

/** Where the window of a kind begins on the field, for its caption; null when there is none. */
export function windowStart(bars: readonly DayBar[], width: number, kind: 'strip' | 'handOver'): number | null {
  const first = bars.findIndex((bar) => bar[kind]);
  return first < 0 ? null : (first * width) / bars.length;
}

function windowMark(bars: readonly DayBar[], step: number, gap: number, size: DayBarSize): DayMark[] {
  const first = bars.findIndex((bar) => bar.strip);
  if (first < 0) return [];
  const days = bars.filter((bar) => bar.strip).length;
  const { bar, rise, band, top } = daySizes[size];
  return [
    {
      key: 'strip window',
      x: first * step - 1,
      y: top + rise - band,
      width: days * step - gap + 2,
      height: bar + 2 * band,
      ink: 'band',
      look: 'fill',
    },
  ];
}

function marksOf(day: DayBar, x: number, width: number, size: DayBarSize): DayMark[] {
  const { bar, rise, fall, top } = daySizes[size];
  const y = top + rise;
  const key = String(day.day);
  const marks: DayMark[] = [];
  if (day.when === 'today') marks.push({ key, x, y: top, width, height: rise + bar + fall, ink: 'ink', look: 'fill' });
  else if (day.when === 'past')
    marks.push({ key, x, y, width, height: bar, ink: inkOf(day.stage), look: day.unseen ? 'dashed' : 'fill' });
  else if (day.expected) marks.push({ key, x, y, width, height: bar, ink: 'control', look: 'fill' });
  else {
    const height = day.strip || day.release ? bar : bar * SHORT;
    marks.push({ key, x, y: y + bar - height, width, height, ink: 'control', look: 'line' });
  }
  if (day.checked) {
    const above = day.when === 'today' ? top : y;
    marks.push({
      key: `${key} check`,
      x: x + (width - CHECK) / 2,
      y: above - CHECK - 5,
      width: CHECK,
      height: CHECK,
      ink: 'ink',
      look: 'fill',
    });
  }
  return marks;
}

const inkOf = (stage: DayBar['stage']): Ink => (stage === 'guarded' ? 'fry' : stage);

/** A line under the bars while the parents guard free-swimming young, and under the days she may hand them over. */
function underlines(bars: readonly DayBar[], step: number, gap: number, size: DayBarSize): DayMark[] {
  const { bar, rise, fall, top } = daySizes[size];
  const y = top + rise + bar + fall - 2;
  return bars.flatMap((day, i): DayMark[] =>
    day.handOver || day.stage === 'guarded'
      ? [
          {
            key: `${day.day} line`,
            x: i * step,
            y,
            width: day.handOver ? step - gap : step,
            height: 2,
            ink: 'ink',
            look: 'fill',
          },
        ]
      : [],
  );
}
