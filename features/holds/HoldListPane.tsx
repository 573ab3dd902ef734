import { useQuery } from '@tanstack/react-query';
import { EmptyState } from '@/components/ui/EmptyState';
import { Loading } from '@/components/ui/Loading';
import { MiniDayBars } from '@/components/ui/MiniDayBars';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { clockOf } from '@/shared/holds/clockOf';
import { clockSentence, daysHeld, nextInClock } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { dayBars } from '@/shared/holds/dayBars';
import { HoldName, HoldPlace } from './HoldName';
import { openHoldsQuery } from './queries';
import { whoHolds } from './whoHolds';

/** The open holds beside the one that is shown, on wide screens. */
export function HoldListPane({ selected }: { selected: string }) {
  const room = useRoom();
  const { data } = useQuery(openHoldsQuery(room.id));
  return (
    <Screen title="Holding" subtitle={data ? `${data.length} now` : undefined}>
      {data === undefined ? (
        <Loading label="Loading the holds" />
      ) : data.length === 0 ? (
        <EmptyState small title="Nobody holds" words="Holds that have ended are on their females’ pages." />
      ) : (
        <Rows bleed open label="Open holds">
          {byNextDate(data, room.today).map((hold) => (
            <PaneRow key={hold.id} hold={hold} selected={hold.id === selected} />
          ))}
        </Rows>
      )}
    </Screen>
  );
}

const byNextDate = (holds: HoldRow[], today: string) => {
  const releaseOf = (hold: HoldRow) => clockOf(hold.clock, hold, today)?.clock.releaseOn ?? '9';
  return holds.toSorted((a, b) => (releaseOf(a) < releaseOf(b) ? -1 : 1));
};

function PaneRow({ hold, selected }: { hold: HoldRow; selected: boolean }) {
  const room = useRoom();
  const clock = clockOf(hold.clock, hold, room.today)?.clock;
  const next = clock ? nextInClock(clock, hold.plan) : '';
  return (
    <Row
      href={`/r/${room.id}/holds/${hold.id}`}
      label={`${whoHolds(hold)} in ${hold.tank.code}. ${clock ? clockSentence(clock) : ''} ${next}`}
      selected={selected}
      figure={String(daysHeld(hold, room.today))}
      unit="day"
      title={<HoldName hold={hold} />}
      note={<HoldPlace hold={hold} />}
    >
      {clock ? (
        <>
          <MiniDayBars bars={dayBars(clock, { plan: hold.plan })} sentence={clockSentence(clock)} width={200} />
          <Text size="small" tone="soft">
            {next}
          </Text>
        </>
      ) : null}
    </Row>
  );
}
