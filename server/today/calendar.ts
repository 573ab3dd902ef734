import ical, { ICalCalendarMethod, ICalEventTransparency } from 'ical-generator';
import { addDays, type Day } from '../../shared/days';
import type { Due } from '../../shared/today/due';
import { dueFacts, dueTitle } from '../../shared/today/dueWords';
import { todayOf } from '../../shared/today/todayOf';
import type { MemberAsked } from './asMember';
import { todayFacts } from './facts';

/** How often a subscriber may look again. */
const AGAIN_SECONDS = 3600;

/**
 * What is due and will be, as all-day events (RFC 5545): each on its day, windows over theirs. The key names an event for
 * good, so that one that is put off moves in the phone's calendar. Neither money nor a buyer's name is in it.
 */
export async function calendarOf({ scope, units, roomName }: MemberAsked): Promise<string> {
  const { due, ahead } = todayOf(await todayFacts(scope), units);
  const calendar = ical({ name: roomName, method: ICalCalendarMethod.PUBLISH, ttl: AGAIN_SECONDS });
  for (const one of [...due, ...ahead]) {
    calendar.createEvent({
      id: `${one.key}@kinwater`,
      allDay: true,
      timezone: 'UTC',
      start: midnight(one.dueOn),
      end: midnight(addDays(lastDayOf(one), 1)),
      stamp: new Date(scope.now),
      summary: [dueTitle(one), one.code].filter(Boolean).join(', '),
      description: [dueFacts(one), one.assignedTo && `For ${one.assignedTo.name}.`].filter(Boolean).join(' '),
      transparency: ICalEventTransparency.TRANSPARENT,
      url: `${scope.house.config.origin}/r/${scope.roomId}/tasks`,
    });
  }
  return calendar.toString();
}

/** A strip window is shown as a span; a release is a day that is only about right. */
const lastDayOf = ({ kind, dueOn, untilOn }: Due): Day =>
  kind === 'stripWindow' && untilOn && untilOn > dueOn ? untilOn : dueOn;

const midnight = (day: Day) => new Date(`${day}T00:00:00Z`);
