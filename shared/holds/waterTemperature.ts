import { BadValue, finite } from '../badValue';
import { addDays, type Day, daysBetween, isDay } from '../days';

/** A temperature recorded in the tank. Several on one day count as their mean. */
export type TemperatureReading = { on: Day; celsius: number };

const RECENT_DAYS = 7;

/**
 * The water's temperature on any day: the mean of that day's readings, a straight line between days with readings, the
 * first day's value before them, and after the last one the mean of its week, so that one odd reading does not steer a
 * forecast of weeks. Null when nothing was recorded. Throws `BadValue` for a reading that is no temperature or day.
 */
export function temperatureOn(readings: TemperatureReading[]): ((day: Day) => number) | null {
  const days = dailyMeans(readings);
  const first = days[0];
  const last = days.at(-1);
  if (!first || !last) return null;
  const weekBefore = addDays(last.on, 1 - RECENT_DAYS);
  const recent = mean(days.filter(({ on }) => on >= weekBefore).map(({ celsius }) => celsius));
  return (day) => {
    if (day <= first.on) return first.celsius;
    if (day > last.on) return recent;
    const after = days.findIndex(({ on }) => on >= day);
    const to = days[after] ?? last;
    const from = days[after - 1] ?? first;
    return from.celsius + (to.celsius - from.celsius) * (daysBetween(from.on, day) / daysBetween(from.on, to.on));
  };
}

function dailyMeans(readings: TemperatureReading[]): TemperatureReading[] {
  const byDay = new Map<Day, { sum: number; count: number }>();
  for (const { on, celsius } of readings) {
    const { sum, count } = byDay.get(on) ?? { sum: 0, count: 0 };
    byDay.set(on, { sum: sum + finite('Temperature', celsius, { min: 0, max: 45 }), count: count + 1 });
  }
  for (const on of byDay.keys()) if (!isDay(on)) throw new BadValue('Day of a reading', on, 'a date is needed');
  return [...byDay]
    .map(([on, { sum, count }]) => ({ on, celsius: sum / count }))
    .sort((a, b) => (a.on < b.on ? -1 : 1));
}

export const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
