import { addDays, type Day, isoWeek } from '../days';

/** How a task comes back: so many days after it was done, or on its weekday every so many weeks. */
export type Repeat = { dueOn: Day; everyDays: number | null; onWeekday: number | null };

const WEEK = 7;
export const WEEKDAY_WORDS = ['Mondays', 'Tuesdays', 'Wednesdays', 'Thursdays', 'Fridays', 'Saturdays', 'Sundays'];

export const weekdayWord = (weekday: number): string => WEEKDAY_WORDS[weekday - 1] ?? '';

/** Why a rhythm cannot be, by field; empty when it can. */
export function repeatTrouble({ dueOn, everyDays, onWeekday }: Repeat): Record<string, string> {
  if (onWeekday === null) return {};
  if (everyDays === null || everyDays % WEEK !== 0)
    return { everyDays: 'On a weekday it comes back after whole weeks: 7, 14 or 21 days' };
  if (isoWeek(dueOn).weekday !== onWeekday) return { dueOn: `Choose a day among the ${weekdayWord(onWeekday)}` };
  return {};
}

/** When it is due again after it was done or skipped; null when it happens once. A weekday is kept however late it was. */
export function nextDueOn({ dueOn, everyDays, onWeekday }: Repeat, settledOn: Day): Day | null {
  if (everyDays === null) return null;
  if (onWeekday === null) return addDays(settledOn, everyDays);
  let next = addDays(dueOn, everyDays);
  while (next <= settledOn) next = addDays(next, everyDays);
  return next;
}

/** "every 3 days", "every 2 weeks", "on Mondays", "on Mondays, every 2 weeks". */
export function repeatWords({ everyDays, onWeekday }: Omit<Repeat, 'dueOn'>): string | null {
  if (everyDays === null) return null;
  const weeks = everyDays / WEEK;
  if (onWeekday !== null) return `on ${weekdayWord(onWeekday)}${weeks > 1 ? `, every ${weeks} weeks` : ''}`;
  if (Number.isInteger(weeks)) return weeks === 1 ? 'every week' : `every ${weeks} weeks`;
  return everyDays === 1 ? 'every day' : `every ${everyDays} days`;
}
