import ical, { ICalCalendarMethod } from 'ical-generator';
import { addDays } from '../../shared/days';

/** The day of a collection as an all-day event; the hour stands in its name, since the fishroom's clock is not the buyer's. */
export function collectionDay(event: {
  id: string;
  time: string;
  roomName: string;
  place: string | null;
  number: number;
  what: string;
  now: string;
}): string {
  const day = event.time.slice(0, 10);
  const calendar = ical({ name: event.roomName, method: ICalCalendarMethod.PUBLISH });
  calendar.createEvent({
    id: `${event.id}@kinwater`,
    allDay: true,
    start: new Date(`${day}T00:00:00Z`),
    end: new Date(`${addDays(day, 1)}T00:00:00Z`),
    stamp: new Date(event.now),
    timezone: 'UTC',
    summary: `${event.time.slice(11, 16)} fish from ${event.roomName}`,
    description: `Order ${event.number}: ${event.what}`,
    location: event.place,
  });
  return calendar.toString();
}
