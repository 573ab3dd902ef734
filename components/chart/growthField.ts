import { addDays, type Day, daysBetween } from '@/shared/days';
import type { GrowthChartProps } from './GrowthChart';
import { type DayTick, dayX, monthTicks, niceTicks, straight, tickWord } from './scale';

/** Where everything of a growth chart stands. */
export type GrowthField = {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  base: number;
  x: (day: Day) => number;
  y: (value: number) => number;
  ticks: number[];
  months: DayTick[];
  word: (tick: number) => string;
};

const LEFT = 30;
const RIGHT = 8;
const TOP = 14;
const FOOT = 26;
const MONTH_WIDTH = 38;

/** Lays the field out: days from the first sample to the last point, lengths from 0 to a round number above all. */
export function growthField(chart: GrowthChartProps, width: number, height: number): GrowthField {
  const { samples, fit = [], forecast = [], target, today } = chart;
  const days = [...samples, ...fit, ...forecast].map((point) => point.day).sort();
  const first = days[0] ?? addDays(today, -30);
  const end = days.at(-1) ?? today;
  const last = daysBetween(first, end) < 14 ? addDays(first, 14) : end;
  const highest = Math.max(1, target?.value ?? 0, ...[...samples, ...fit, ...forecast].map((point) => point.high));
  const ticks = niceTicks(0, highest, 7);
  const [left, right, base] = [LEFT, width - RIGHT, height - FOOT];
  const scaleX = straight([0, daysBetween(first, last)], left, right);
  return {
    width,
    height,
    left,
    right,
    top: TOP,
    base,
    x: dayX(first, scaleX),
    y: straight([0, ticks.at(-1) ?? highest], base, TOP),
    ticks,
    // The last month's word needs room before the edge.
    months: monthTicks(first, last, (right - left) / MONTH_WIDTH).filter(
      (month) => dayX(first, scaleX)(month.day) <= right - 18,
    ),
    word: (tick) => tickWord(tick, ticks),
  };
}
