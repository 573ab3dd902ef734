import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { Aside } from '@/components/ui/Aside';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { IconButton } from '@/components/ui/IconButton';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { SearchLink } from '@/components/ui/SearchLink';
import { Section } from '@/components/ui/Section';
import { WithAside } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { may } from '@/shared/roles';
import type { TodayFacts } from '@/shared/today/facts';
import type { HoldToday } from '@/shared/today/holdsToday';
import { type Today, todayOf } from '@/shared/today/todayOf';
import { DueRows } from './DueRows';
import { LeavingRows } from './LeavingRows';
import { NextStrip } from './NextStrip';
import { todayQuery } from './queries';
import { TreatmentRows } from './TreatmentRows';
import { Troubles } from './Troubles';

type Props = {
  /** The rows of the holds; another feature's, set in by the route. */
  holdRows: (holds: HoldToday[]) => ReactNode;
};

/** What needs doing, worked out and not typed. */
export function TodayScreen({ holdRows }: Props) {
  const room = useRoom();
  const { data: facts, error, refetch } = useQuery(todayQuery(room.id));
  const title = formatDay(room.today, room.today);
  if (!facts) {
    return (
      <Screen title={title}>
        {error ? (
          <ErrorState title="Today could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading today" />
        )}
      </Screen>
    );
  }
  const today = todayOf(facts, room.units);
  return <TodayParts title={title} facts={facts} today={today} holdRows={holdRows} />;
}

/** One column, what cannot wait first; on a wide screen the calendar with what is due beside it. */
function TodayParts({ title, facts, today, holdRows }: Props & { title: string; facts: TodayFacts; today: Today }) {
  const room = useRoom();
  const full = useBreakpoint() === 'full';
  const holding = <Holding today={today} females={facts.females} holdRows={holdRows} />;
  const trouble = <Troubles today={today} />;
  const due = (
    <>
      <LeavingRows orders={today.leaving} today={facts.today} />
      <DueRows due={today.due} today={facts.today} />
      <TreatmentRows care={today.treatments} tanks={facts.tanks} today={facts.today} />
    </>
  );
  const search = `/r/${room.id}/search` as const;
  if (!full) {
    return (
      <Screen title={title} actions={<IconButton icon="search" label="Search" href={search} />}>
        {trouble}
        {holding}
        {due}
      </Screen>
    );
  }
  const aside = (
    <Aside label="Due today">
      {trouble}
      {due}
    </Aside>
  );
  return (
    <WithAside aside={aside}>
      <Screen title={title} actions={<SearchLink href={search} words="Fish, brood, tank, order" />}>
        {holding}
        <NextStrip holds={today.holds} />
      </Screen>
    </WithAside>
  );
}

function Holding({ today, females, holdRows }: Props & { today: Today; females: number }) {
  const room = useRoom();
  const { holds } = today;
  const aside = females > 0 ? `${holds.length} of ${females} females, next date first` : `${holds.length}`;
  return (
    <Section title="Holding" aside={holds.length > 0 ? aside : undefined}>
      {holds.length > 0 ? (
        holdRows(holds)
      ) : (
        <EmptyState small title="Nobody holds" words="When you see a full mouth, record it: the days count from there.">
          {may(room.role, 'entry:record') ? (
            <Button label="Holding seen" small href={`/r/${room.id}/record/holding`} />
          ) : null}
        </EmptyState>
      )}
    </Section>
  );
}
