import { Code } from '@/components/ui/Code';
import { DayBars } from '@/components/ui/DayBars';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Clock } from '@/shared/holds/clock';
import { clockSentence, clockState, nextInClock, spawnDoubt } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { dayBars, dayNumber } from '@/shared/holds/dayBars';
import type { HoldToday } from '@/shared/today/todayOf';

/** Open holds as day-bars, one row each. */
export function HoldRows({ holds }: { holds: HoldToday[] }) {
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
      title={
        <Text strong>
          <SexShape sex="female" /> {hold.holder?.code ? <Code>{hold.holder.code}</Code> : who}
        </Text>
      }
      state={
        <Text size="small" strong={isPressing(hold, clock)} tone={isPressing(hold, clock) ? 'ink' : 'soft'}>
          {next}
        </Text>
      }
      note={
        <Text size="small" tone="soft" cut>
          {hold.displayName ? <Text italic>{shortName(hold.displayName)}</Text> : 'Species not known'}
          {` ${hold.locality ?? ''} · `}
          <Code>{hold.tank.code}</Code>
        </Text>
      }
    >
      {clock ? <HoldBars hold={hold} clock={clock} /> : null}
    </Row>
  );
}

/** The picture of a hold's days, in a row or on its page. */
export function HoldBars({ hold, clock, size = 'row' }: { hold: HoldRow; clock: Clock; size?: 'row' | 'page' }) {
  const { stripFrom, stripTo, handOverFrom, handOverTo } = clock;
  const strips = hold.plan === 'strip' && stripFrom && stripTo;
  const window = strips
    ? { word: 'strip', from: stripFrom, to: stripTo }
    : handOverFrom && handOverTo
      ? { word: 'hand-over', from: handOverFrom, to: handOverTo }
      : null;
  const state = clockState(clock, hold.plan);
  return (
    <DayBars
      bars={dayBars(clock, { checks: hold.checkedOn, endedOn: hold.endedOn })}
      sentence={clockSentence(clock)}
      size={size}
      windowWords={
        window ? `${window.word} ${dayNumber(clock, window.from)}–${dayNumber(clock, window.to)}` : undefined
      }
      windowOpen={state === 'strip' || state === 'handOver'}
      endWords={`${clock.kind === 'guards' ? 'swim' : 'release'} ~${dayNumber(clock, clock.releaseOn)}`}
      startWords={size === 'page' ? 'day 1' : undefined}
    />
  );
}

/** "DUMA-A04", or "1 of 9, can’t tell which". */
export function whoHolds({ holder, femalesInColony }: HoldRow): string {
  if (holder?.code) return holder.code;
  return femalesInColony > 1 ? `1 of ${femalesInColony}, can’t tell which` : 'Female, can’t tell which';
}

function nextWords(hold: HoldRow, clock: Clock, checkDue: boolean): string {
  const state = clockState(clock, hold.plan);
  if (checkDue && (state === 'early' || state === 'waiting')) return 'Check due';
  const doubt = spawnDoubt(clock);
  return doubt && clock.day <= 7 ? doubt : nextInClock(clock, hold.plan);
}

const isPressing = (hold: HoldRow, clock: Clock | null): boolean =>
  clock !== null && ['strip', 'handOver', 'release', 'late'].includes(clockState(clock, hold.plan));

/** "T. duboisi": the genus is the same for half the room. */
const shortName = (name: string): string => name.replace(/^(\p{Lu})\p{Ll}+ (?=\p{Ll})/u, '$1. ');
