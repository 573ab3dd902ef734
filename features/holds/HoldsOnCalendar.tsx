import { HoldCalendar } from '@/components/chart/HoldCalendar';
import { useRoom } from '@/hooks/useRoom';
import { clockSentence } from '@/shared/holds/clockWords';
import { dayBars } from '@/shared/holds/dayBars';
import type { HoldToday } from '@/shared/today/holdsToday';
import { HoldName, HoldPlaceShort } from './HoldName';
import { isPressing, nextWords } from './nextWords';
import { whoHolds } from './whoHolds';

/** Every open hold on one calendar, so that strips and releases of one week are seen to be so. */
export function HoldsOnCalendar({ holds }: { holds: HoldToday[] }) {
  const room = useRoom();
  return (
    <HoldCalendar
      today={room.today}
      holds={holds.map(({ hold, clock, checkDue }) => {
        const state = clock ? nextWords(hold, clock, checkDue) : 'Holding time not known';
        return {
          id: hold.id,
          href: `/r/${room.id}/holds/${hold.id}`,
          figure: clock ? String(clock.day) : '?',
          title: <HoldName hold={hold} />,
          note: <HoldPlaceShort hold={hold} />,
          bars: clock ? dayBars(clock, { plan: hold.plan, checks: hold.checkedOn, endedOn: hold.endedOn }) : [],
          state,
          due: isPressing(hold, clock),
          label: `${whoHolds(hold)}, ${clock ? clockSentence(clock) : ''} ${state}`,
        };
      })}
    />
  );
}
