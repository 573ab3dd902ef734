export const WHENS = ['late', 'today', 'tomorrow', 'week', 'later'] as const;
export type When = (typeof WHENS)[number];

export const WHEN_WORDS: Record<When, string> = {
  late: 'Late',
  today: 'Today',
  tomorrow: 'Tomorrow',
  week: 'In the next 7 days',
  later: 'Later',
};

/** Under which head something stands in a list of tasks, by how many days it is late. */
export function whenOf(lateDays: number): When {
  if (lateDays > 0) return 'late';
  if (lateDays === 0) return 'today';
  if (lateDays === -1) return 'tomorrow';
  return lateDays >= -7 ? 'week' : 'later';
}
