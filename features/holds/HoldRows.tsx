import { useBreakpoint } from '@/components/theme/breakpoint';
import { DayBars } from '@/components/ui/DayBars';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Clock } from '@/shared/holds/clock';
import { clockSentence, clockState } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { dayBars } from '@/shared/holds/dayBars';
import type { HoldToday } from '@/shared/today/holdsToday';
import { windowOf } from './clockWindow';
import { HoldName, HoldPlaceShort } from './HoldName';
import { HoldsOnCalendar } from './HoldsOnCalendar';
import { isPressing, nextWords } from './nextWords';
import { whoHolds } from './whoHolds';

/** Open holds as day-bars: a row each, or all on one calendar where there is room for it. */
export function HoldRows({ holds }: { holds: HoldToday[] }) {
  const full = useBreakpoint() === 'full';
  if (full) return <HoldsOnCalendar holds={holds} />;
  return (
    <Rows>
      {holds.map((one) => (
        <OpenHoldRow key={one.hold.id} {...one} />
      ))}
    </Rows>
  );
}

function OpenHoldRow({ hold, clock, checkDue }: HoldToday) {
  const room = useRoom();
  const who = whoHolds(hold);
  const next = clock ? nextWords(hold, clock, checkDue) : 'Holding time not known';
  return (
    <Row
      href={`/r/${room.id}/holds/${hold.id}`}
      label={`${who}, ${clock ? clockSentence(clock) : ''} ${next}`}
      figure={clock ? String(clock.day) : '?'}
      unit="day"
      title={<HoldName hold={hold} />}
      state={
        <Text size="small" strong={isPressing(hold, clock)} tone={isPressing(hold, clock) ? 'ink' : 'soft'}>
          {next}
        </Text>
      }
      note={<HoldPlaceShort hold={hold} />}
    >
      {clock ? <HoldBars hold={hold} clock={clock} /> : null}
    </Row>
  );
}

/** The picture of a hold's days, in a row or on its page. */
export function HoldBars({ hold, clock, size = 'row' }: { hold: HoldRow; clock: Clock; size?: 'row' | 'page' }) {
  const state = clockState(clock, hold.plan);
  const words = hold.endedOn ? { endWords: `day ${clock.day}` } : windowOf(clock, hold.plan);
  return (
    <DayBars
      bars={dayBars(clock, { plan: hold.plan, checks: hold.checkedOn, endedOn: hold.endedOn })}
      sentence={clockSentence(clock)}
      size={size}
      windowOpen={!hold.endedOn && (state === 'strip' || state === 'handOver')}
      {...words}
      {...(size === 'page' ? { startWords: 'day 1' } : {})}
    />
  );
}
