import { finite } from '../badValue';
import { addDays, type Day } from '../days';
import { type TemperatureReading, temperatureOn } from './waterTemperature';

/** How long development takes: `days` at `atC`, faster by `q10` for each 10 °C. */
export type Pace = { days: number; atC: number; q10: number };

/** Q10 is an assumption; outside these temperatures it says nothing, and the nearer limit is used. */
const VALID_C = [22, 30] as const;

/** Days that the same development takes at another temperature: D(T) = D(ref) Q10^((ref - T) / 10). */
export function daysAt({ days, atC, q10 }: Pace, celsius: number): number {
  finite('Days', days, { above: 0, max: 400 });
  finite('Q10', q10, { min: 1, max: 10 });
  return days * q10 ** ((finite('Reference temperature', atC) - finite('Temperature', celsius)) / 10);
}

export type Development = {
  /** Share of the way after so many days from the start; linear within a day. */
  after(days: number): number;
  /** Days from the start until `share` of the way is gone, counted from `from` days after the start. */
  until(share: number, from: number): number;
  /** Temperature used on the day so many whole days after the start. */
  celsius(day: number): number;
};

/** Adds up the rate 1 / D(T) of each day, from `start` on. Without readings every day is at the reference temperature. */
export function developmentFrom(start: Day, pace: Pace, readings: TemperatureReading[]): Development {
  const [coldest, warmest] = [Math.min(VALID_C[0], pace.atC), Math.max(VALID_C[1], pace.atC)];
  const recorded = temperatureOn(readings);
  const celsius = (day: number) => recorded?.(addDays(start, day)) ?? pace.atC;
  const rate = (day: number) => 1 / daysAt(pace, Math.min(warmest, Math.max(coldest, celsius(day))));
  const sums = [0];
  const sumTo = (day: number) => {
    for (let i = sums.length; i <= day; i += 1) sums.push((sums[i - 1] ?? 0) + rate(i - 1));
    return sums[day] ?? 0;
  };
  const after = (days: number) => {
    const whole = Math.floor(days);
    return sumTo(whole) + (days - whole) * (sumTo(whole + 1) - sumTo(whole));
  };
  const until = (share: number, from: number) => {
    const goal = after(from) + share;
    let day = Math.floor(from);
    while (sumTo(day + 1) < goal) day += 1;
    return day + (goal - sumTo(day)) / (sumTo(day + 1) - sumTo(day));
  };
  return { after, until, celsius };
}

/** Whether the temperature is outside what the rate can be trusted for. */
export const isBeyondTrust = (celsius: number): boolean => celsius < VALID_C[0] || celsius > VALID_C[1];
