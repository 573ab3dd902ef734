import { addMonths, type Day, daysBetween, formatShortDay } from '@/shared/days';

/** From a value to px along one axis. */
export type Scale = (value: number) => number;

/** A straight scale; `from` and `to` may run either way. */
export function straight(domain: readonly [number, number], from: number, to: number): Scale {
  const span = domain[1] - domain[0] || 1;
  return (value) => from + ((value - domain[0]) / span) * (to - from);
}

const NICE = [1, 2, 2.5, 5, 10];

/** Round steps that cover `most` from `least` with at most `lines` lines between. */
export function niceTicks(least: number, most: number, lines = 6): number[] {
  const rough = Math.max(most - least, 1e-9) / lines;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = (NICE.find((nice) => nice * power >= rough - 1e-12) ?? 10) * power;
  const first = Math.floor(least / step + 1e-9);
  const last = Math.ceil(most / step - 1e-9);
  return Array.from({ length: last - first + 1 }, (_, i) => Number(((first + i) * step).toPrecision(12)));
}

/** Decimals needed to tell the ticks apart. */
export function tickWord(value: number, ticks: readonly number[]): string {
  const step = (ticks[1] ?? 1) - (ticks[0] ?? 0);
  const decimals = step >= 1 && Number.isInteger(step) ? 0 : Math.min(3, Math.max(1, Math.ceil(-Math.log10(step))));
  return value.toFixed(decimals);
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

export type DayTick = { day: Day; word: string };

/** First days of months in a span, thinned to what fits; January of a long span says its year. */
export function monthTicks(from: Day, to: Day, most: number): DayTick[] {
  const first = from.endsWith('-01') ? from : addMonths(`${from.slice(0, 8)}01`, 1);
  const months: Day[] = [];
  for (let day = first; day <= to && months.length < 600; day = addMonths(day, 1)) months.push(day);
  if (months.length < 2)
    return [from, to].filter((day, i) => i === 0 || day !== from).map((day) => ({ day, word: formatShortDay(day) }));
  const every = [1, 2, 3, 6, 12].find((n) => months.length / n <= most) ?? 24;
  const kept = months.filter((day) => (Number(day.slice(5, 7)) - 1) % Math.min(every, 12) === 0);
  return (every > 12 ? kept.filter((_, i) => i % 2 === 0) : kept).map((day) => ({ day, word: monthWord(day, every) }));
}

function monthWord(day: Day, every: number): string {
  const month = Number(day.slice(5, 7));
  return month === 1 && every > 1 ? day.slice(0, 4) : (MONTHS[month - 1] ?? '');
}

/** Days after the first day of an axis. */
export const dayX = (first: Day, scale: Scale) => (day: Day) => scale(daysBetween(first, day));

/** A path through points, in tenths of a px. */
export const pathOf = (points: readonly (readonly [number, number])[]): string =>
  points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`).join('');
