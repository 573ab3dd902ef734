import type { DayChoice } from '@/components/form/DateField';
import { addDays, type Day, daysBetween, formatShortDay } from '@/shared/days';

type Known = { firstSeenOn: Day; today: Day; lookedOn: Day | null; lastEndedOn: Day | null; longest: number };

/** One tap each for "last seen not holding"; nothing before her last hold ended, where that is known. */
export function lastLookedChoices({ firstSeenOn, today, lookedOn, lastEndedOn, longest }: Known): DayChoice[] {
  const isToday = firstSeenOn === today;
  const ago = (days: number) => addDays(firstSeenOn, -days);
  const bound = lastEndedOn && daysBetween(lastEndedOn, firstSeenOn) < longest ? lastEndedOn : ago(longest);
  const check = lookedOn && lookedOn < firstSeenOn && lookedOn > bound ? lookedOn : null;
  const choices: DayChoice[] = [
    { word: isToday ? 'Yesterday' : 'The day before', day: ago(1) },
    ...(check && check !== ago(1) ? [{ word: `Last check, ${formatShortDay(check)}`, day: check }] : []),
    { word: isToday ? 'A week' : 'A week before', day: ago(7) },
    { word: isToday ? 'Two weeks' : 'Two weeks before', day: ago(14) },
  ];
  return [
    ...choices.filter(({ day }, i) => day > bound && choices.findIndex((other) => other.day === day) === i),
    { word: bound === lastEndedOn ? `Since her last hold, ${formatShortDay(bound)}` : 'Not looked', day: bound },
  ];
}
