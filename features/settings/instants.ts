import { type Day, dayOf } from '@/shared/days';

/** "09:12" on the fishroom's clock. */
export const atTime = (instant: string, timeZone: string): string =>
  new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit' }).format(Date.parse(instant));

/** Things under the fishroom's days, in the order they come in. */
export function byDay<T>(things: T[], instantOf: (thing: T) => string, timeZone: string): [Day, T[]][] {
  const days = new Map<Day, T[]>();
  for (const thing of things) {
    const day = dayOf(Date.parse(instantOf(thing)), timeZone);
    days.set(day, [...(days.get(day) ?? []), thing]);
  }
  return [...days];
}
