import { describe, expect, test } from 'vitest';
import { kinshipSizes } from '@/components/chart/kinshipSizes';
import { cellBeside } from '@/components/chart/kinshipSteps';
import { kinshipWord } from '@/components/chart/kinshipWord';
import { monthTicks, niceTicks, straight, tickWord } from '@/components/chart/scale';
import { shareWord } from '@/components/chart/shareWord';
import { type DayBar, dayBarMarks, dayBarsWidth, windowStart } from '@/components/ui/dayBarMarks';
import { centredOn, fitted, kept, MOST_ZOOM, zoomedAt } from '@/hooks/panZoom';

describe('axes', () => {
  test('lengths from 0 get whole numbers that reach above the highest', () =>
    expect(niceTicks(0, 5.9, 7)).toEqual([0, 1, 2, 3, 4, 5, 6]));

  test('never more lines than asked for, whatever the range', () => {
    for (const most of [0.02, 0.7, 1, 3.3, 9, 12, 47, 180, 999, 12_345]) {
      const ticks = niceTicks(0, most, 7);
      expect(ticks.length).toBeLessThanOrEqual(8);
      expect(ticks.at(-1)).toBeGreaterThanOrEqual(most);
    }
  });

  test('fractions are told with the decimals they need', () => {
    const ticks = niceTicks(8.5, 9, 4);
    expect(new Set(ticks.map((tick) => tickWord(tick, ticks))).size).toBe(ticks.length);
  });

  test('a scale may run upwards from the bottom', () => {
    const y = straight([0, 10], 190, 14);
    expect(y(0)).toBe(190);
    expect(y(10)).toBe(14);
  });

  test('months stand at their first day and are thinned to what fits', () => {
    expect(monthTicks('2025-11-09', '2026-02-20', 8).map((tick) => tick.day)).toEqual([
      '2025-12-01',
      '2026-01-01',
      '2026-02-01',
    ]);
    const years = monthTicks('2020-03-05', '2026-05-14', 8);
    expect(years.length).toBeLessThanOrEqual(8);
    expect(years.map((tick) => tick.word)).toContain('2024');
  });

  test('a span within one month is told by its ends', () =>
    expect(monthTicks('2026-05-03', '2026-05-14', 8).map((tick) => tick.word)).toEqual(['3 May', '14 May']));
});

describe('figures', () => {
  test('a doubt never reads as certain', () => {
    expect(shareWord(0.79)).toBe('79 %');
    expect(shareWord(0.999)).toBe('> 99 %');
    expect(shareWord(0.001)).toBe('< 1 %');
    expect(shareWord(1)).toBe('100 %');
  });

  test('F of the young is written in thousandths without a nought before the point', () => {
    expect(kinshipWord(0.125)).toBe('.125');
    expect(kinshipWord(0.25)).toBe('.250');
    expect(kinshipWord(0)).toBe('0');
    expect(kinshipWord(1)).toBe('1.000');
  });

  test('long codes go under their shape before they are cut', () => {
    const fish = (code: string) => [{ id: code, code, short: code, sex: 'male' as const }];
    expect(kinshipSizes(fish('A04'), fish('A03')).stacked).toBe(false);
    expect(kinshipSizes(fish('DUMA-A04'), fish('A03')).stacked).toBe(true);
  });
});

describe('walking a kinship table', () => {
  const table = { rows: 3, columns: 4 };
  test('arrow keys go to the cell beside, and stop at the edge', () => {
    expect(cellBeside({ row: 0, column: 0 }, 'ArrowDown', table)).toEqual({ row: 1, column: 0 });
    expect(cellBeside({ row: 2, column: 3 }, 'ArrowLeft', table)).toEqual({ row: 2, column: 2 });
    expect(cellBeside({ row: 2, column: 3 }, 'ArrowRight', table)).toBeNull();
    expect(cellBeside({ row: 0, column: 0 }, 'ArrowUp', table)).toBeNull();
  });
  test('Home and End go along the row; other keys nowhere', () => {
    expect(cellBeside({ row: 1, column: 2 }, 'Home', table)).toEqual({ row: 1, column: 0 });
    expect(cellBeside({ row: 1, column: 2 }, 'End', table)).toEqual({ row: 1, column: 3 });
    expect(cellBeside({ row: 1, column: 2 }, 'a', table)).toBeNull();
  });
});

describe('day-bars', () => {
  const day = (n: number, more: Partial<DayBar> = {}): DayBar => ({
    day: n,
    when: n < 3 ? 'past' : n === 3 ? 'today' : 'ahead',
    stage: 'egg',
    unseen: false,
    strip: false,
    handOver: false,
    release: false,
    expected: false,
    checked: false,
    ...more,
  });
  const bars = [
    day(1, { unseen: true }),
    day(2, { checked: true }),
    day(3),
    day(4, { strip: true }),
    day(5, { strip: true }),
    day(6),
    day(7, { release: true, expected: true }),
  ];
  const marks = dayBarMarks(bars, 84, 'row');
  const markOf = (key: string) => {
    const mark = marks.find((one) => one.key === key);
    if (!mark) throw new Error(`no mark ${key}`);
    return mark;
  };

  test('a day that nobody saw is dashed, a seen one solid', () => {
    expect(markOf('1').look).toBe('dashed');
    expect(markOf('2').look).toBe('fill');
  });

  test('today stands taller than every other day', () => {
    const others = marks.filter((mark) => mark.key !== '3' && mark.ink !== 'band');
    for (const other of others) expect(markOf('3').height).toBeGreaterThan(other.height);
  });

  test('the strip window’s band covers exactly its days', () => {
    const band = markOf('strip window');
    expect(band.x).toBeLessThanOrEqual(markOf('4').x);
    expect(band.x).toBeGreaterThan(markOf('3').x + markOf('3').width);
    expect(band.x + band.width).toBeGreaterThanOrEqual(markOf('5').x + markOf('5').width);
    expect(band.x + band.width).toBeLessThan(markOf('6').x);
  });

  test('the expected day is solid, days ahead without a window are short', () => {
    expect(markOf('7').look).toBe('fill');
    expect(markOf('6').height).toBeLessThan(markOf('4').height / 2);
  });

  test('a check is a small square above its day', () => {
    const check = markOf('2 check');
    expect(check.y + check.height).toBeLessThan(markOf('2').y);
    expect(check.x).toBeGreaterThanOrEqual(markOf('2').x);
  });

  test('all marks stay within the width, however many days', () => {
    const many = Array.from({ length: 150 }, (_, i) => day(i + 4));
    for (const mark of dayBarMarks(many, 294, 'row')) {
      expect(mark.width).toBeGreaterThan(0);
      expect(mark.x + mark.width).toBeLessThanOrEqual(295);
    }
  });

  test('guarded young and days of handing over carry a line below', () => {
    const guarded = dayBarMarks([day(1), day(2, { stage: 'guarded' }), day(3, { handOver: true })], 84, 'row');
    expect(guarded.filter((mark) => mark.key.endsWith('line')).map((mark) => mark.key)).toEqual(['2 line', '3 line']);
  });

  test('bars stay bars on a wide screen', () => expect(dayBarsWidth(26, 1100, 'row')).toBeLessThan(400));

  test('without a window there is no place for its caption', () => {
    expect(windowStart([day(1)], 84, 'strip')).toBeNull();
    expect(windowStart(bars, 84, 'strip')).toBeCloseTo(36, 5);
  });
});

describe('a pedigree in its window', () => {
  const drawing = { width: 800, height: 600 };
  const window = { width: 400, height: 400 };

  test('fits whole and in the middle', () => {
    const view = fitted(drawing, window);
    expect(drawing.width * view.k).toBeLessThanOrEqual(window.width);
    expect(view.x * 2 + drawing.width * view.k).toBeCloseTo(window.width, 6);
  });

  test('the point under the finger stays there while it is sized', () => {
    const view = { x: -50, y: 20, k: 0.8 };
    const at = { x: 120, y: 90 };
    const after = zoomedAt(view, 1.5, at);
    expect((at.x - after.x) / after.k).toBeCloseTo((at.x - view.x) / view.k, 6);
    expect((at.y - after.y) / after.k).toBeCloseTo((at.y - view.y) / view.k, 6);
  });

  test('it cannot be sized without end nor pushed out of sight', () => {
    expect(zoomedAt({ x: 0, y: 0, k: 2 }, 100, { x: 0, y: 0 }).k).toBe(MOST_ZOOM);
    const lost = kept({ x: -10_000, y: 10_000, k: 1 }, drawing, window);
    expect(lost.x + drawing.width).toBeGreaterThan(0);
    expect(lost.y).toBeLessThan(window.height);
  });

  test('a chosen animal comes to the middle', () => {
    const view = centredOn({ x: 0, y: 0, k: 0.6 }, { x: 700, y: 500 }, window);
    expect(view.x + 700 * view.k).toBeCloseTo(200, 6);
    expect(view.y + 500 * view.k).toBeCloseTo(200, 6);
  });
});
