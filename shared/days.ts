import * as z from 'zod/mini';
import { BadValue, finite, whole } from './badValue';

const MS_PER_DAY = 86_400_000;
const DAYS_PER_MONTH = 365 / 12;
const PATTERN = /^(?:19|20|21)\d{2}-\d{2}-\d{2}$/;
const WEEKDAYS = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'] as const;
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

/** A date on the fishroom's calendar, `'2026-05-14'`. It has no time zone; two of them compare as text. */
export type Day = string;

/** Whether the text is a date that exists, from 1900 to 2199. */
export function isDay(text: string): boolean {
  if (!PATTERN.test(text)) return false;
  const ms = Date.parse(`${text}T00:00:00Z`);
  return Number.isFinite(ms) && new Date(ms).toISOString().slice(0, 10) === text;
}

/** The shape of a day in contracts and forms. */
export const DayText = z.string('Choose a date').check(z.refine(isDay, 'Type a date such as 2026-05-14'));

function msOf(day: Day): number {
  if (!isDay(day)) throw new BadValue('Day', day, 'a date such as 2026-05-14 is needed');
  return Date.parse(`${day}T00:00:00Z`);
}

/** The day `count` days later; earlier if `count` is negative. Throws `BadValue`, also when it would leave 1900 to 2199. */
export function addDays(day: Day, count: number): Day {
  const later = new Date(msOf(day) + whole('Days to add', count, -100_000) * MS_PER_DAY).toISOString().slice(0, 10);
  if (!isDay(later)) throw new BadValue('Day', later, 'a date from 1900 to 2199 is needed');
  return later;
}

/** Civil days from `from` to `to`: 0 on the same day, negative when `to` is earlier. Clock changes do not matter. */
export function daysBetween(from: Day, to: Day): number {
  return Math.round((msOf(to) - msOf(from)) / MS_PER_DAY);
}

/** Every day from `from` to `to`, both included; none when `to` is earlier. */
export function daysFrom(from: Day, to: Day): Day[] {
  return Array.from({ length: Math.max(0, daysBetween(from, to) + 1) }, (_, i) => addDays(from, i));
}

/** The same date `count` calendar months later; the month's last day where that date does not exist. */
export function addMonths(day: Day, count: number): Day {
  const date = new Date(msOf(day));
  const first = Date.UTC(date.getUTCFullYear(), date.getUTCMonth() + whole('Months to add', count, -3600), 1);
  const lastOfMonth = new Date(first);
  lastOfMonth.setUTCMonth(lastOfMonth.getUTCMonth() + 1, 0);
  const dayOfMonth = Math.min(date.getUTCDate(), lastOfMonth.getUTCDate());
  return addDays(new Date(first).toISOString().slice(0, 10), dayOfMonth - 1);
}

/** The ISO 8601 week a day belongs to. Its year may differ from the day's own; `weekday` is 1 on Monday. */
export function isoWeek(day: Day): { year: number; week: number; weekday: number } {
  const weekday = weekdayOf(day);
  const thursday = addDays(day, 4 - weekday);
  const year = Number(thursday.slice(0, 4));
  return { year, week: Math.floor(daysBetween(`${year}-01-01`, thursday) / 7) + 1, weekday };
}

function weekdayOf(day: Day): number {
  return new Date(msOf(day)).getUTCDay() || 7;
}

// Making a formatter costs far more than using it.
const calendars = new Map<string, Intl.DateTimeFormat>();

function calendarOf(timeZone: string): Intl.DateTimeFormat {
  const known = calendars.get(timeZone);
  if (known) return known;
  try {
    const made = new Intl.DateTimeFormat('en-GB', {
      timeZone,
      calendar: 'iso8601',
      numberingSystem: 'latn',
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
    });
    calendars.set(timeZone, made);
    return made;
  } catch {
    throw new BadValue('Time zone', timeZone, 'a zone such as Europe/Oslo is needed');
  }
}

/** The calendar day that an instant (UTC milliseconds) falls on in a time zone such as `Europe/Oslo`. */
export function dayOf(instantMs: number, timeZone: string): Day {
  const parts = calendarOf(timeZone).formatToParts(finite('Instant', instantMs, { min: -8.64e15, max: 8.64e15 }));
  const part = (type: string) => parts.find((p) => p.type === type)?.value ?? '';
  const day = `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`;
  if (!isDay(day)) throw new BadValue('Instant', instantMs, 'an instant from 1900 to 2199 is needed');
  return day;
}

const clocks = new Map<string, Intl.DateTimeFormat>();

/** The hour of an instant on the clock of a time zone, 0 to 23. */
export function hourOf(instantMs: number, timeZone: string): number {
  const known = clocks.get(timeZone);
  const clock = known ?? new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', hourCycle: 'h23' });
  clocks.set(timeZone, clock);
  return Number(clock.format(instantMs));
}

/** Whether the runtime knows the time zone. */
export function isTimeZone(text: string): boolean {
  try {
    return text.length > 0 && Boolean(calendarOf(text));
  } catch {
    return false;
  }
}

const dayAndMonth = (day: Day) => `${Number(day.slice(8))} ${MONTHS[Number(day.slice(5, 7)) - 1]}`;

/** More than six calendar months from today, either way: then the year has to be said. */
const isFar = (day: Day, today: Day) => day < addMonths(today, -6) || day > addMonths(today, 6);

/** "Thu 14 May"; with the year, "Thu 14 May 2025", when it is over six months from today. */
export function formatDay(day: Day, today: Day): string {
  const text = `${WEEKDAYS[weekdayOf(day) - 1]} ${dayAndMonth(day)}`;
  return isFar(day, today) ? `${text} ${day.slice(0, 4)}` : text;
}

/** "today", "tomorrow", else as `formatDay`. */
export function dayWords(day: Day, today: Day): string {
  if (day === today) return 'today';
  if (day === addDays(today, 1)) return 'tomorrow';
  return formatDay(day, today);
}

/** "14 May 2026": print and tables of past years, where the weekday says nothing. */
export function formatDate(day: Day): string {
  msOf(day);
  return `${dayAndMonth(day)} ${day.slice(0, 4)}`;
}

/** "14 May": chart axes and narrow rows, where the year is known. */
export function formatShortDay(day: Day): string {
  msOf(day);
  return dayAndMonth(day);
}

const counted = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** How long ago or ahead: "31 days ago", "1 day ago", "today", "tomorrow", "in 6 days". */
export function fromToday(day: Day, today: Day): string {
  const ahead = daysBetween(today, day);
  if (ahead === 0) return 'today';
  if (ahead === 1) return 'tomorrow';
  return ahead < 0 ? `${counted(-ahead, 'day')} ago` : `in ${counted(ahead, 'day')}`;
}

/** An age in the words a keeper uses: days to a fortnight, weeks to thirteen, months to two years, then years and months. */
export function ageWords(days: number): string {
  const age = whole('Age in days', days);
  if (age < 14) return counted(age, 'day');
  if (age < 92) return counted(Math.floor(age / 7), 'week');
  const months = Math.floor(age / DAYS_PER_MONTH);
  if (months < 24) return counted(months, 'month');
  const years = counted(Math.floor(months / 12), 'year');
  return months % 12 === 0 ? years : `${years} ${counted(months % 12, 'month')}`;
}
