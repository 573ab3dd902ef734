import { addDays, type Day } from '../days';

export const WHENS = ['late', 'today', 'tomorrow', 'week', 'later'] as const;
export type When = (typeof WHENS)[number];

export const WHEN_WORDS: Record<When, string> = {
  late: 'Late',
  today: 'Today',
  tomorrow: 'Tomorrow',
  week: 'In the next 7 days',
  later: 'Later',
};

/** Under which head a day stands in a list of tasks. */
export function whenOf(day: Day, today: Day): When {
  if (day < today) return 'late';
  if (day === today) return 'today';
  if (day === addDays(today, 1)) return 'tomorrow';
  return day <= addDays(today, 7) ? 'week' : 'later';
}
