import { useQuery } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { IconButton } from '@/components/ui/IconButton';
import { Loading } from '@/components/ui/Loading';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Toolbar } from '@/components/ui/Toolbar';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { grouped } from '@/shared/grouped';
import { may } from '@/shared/roles';
import type { Due } from '@/shared/today/due';
import type { TodayFacts } from '@/shared/today/facts';
import { todayOf } from '@/shared/today/todayOf';
import { WHEN_WORDS, WHENS, whenOf } from '@/shared/today/when';
import { DueRow } from './DueRow';
import { todayQuery } from './queries';
import { SettledRows } from './SettledRows';

const WHOSE = ['all', 'mine'] as const;

/** Everything that is due and will be, by when; what the data say and what was added by hand. */
export function TasksScreen() {
  const room = useRoom();
  const { data: facts, error, refetch } = useQuery(todayQuery(room.id));
  const add = may(room.role, 'task:write') ? (
    <IconButton icon="plus" label="Add a task" href={`/r/${room.id}/tasks/new`} />
  ) : null;
  return (
    <Screen title="Tasks" back={`/r/${room.id}`} actions={add} measure>
      {facts ? (
        <Tasks facts={facts} />
      ) : error ? (
        <ErrorState title="The tasks could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading tasks" />
      )}
    </Screen>
  );
}

function Tasks({ facts }: { facts: TodayFacts }) {
  const room = useRoom();
  const [whose, setWhose] = useUrlWord<(typeof WHOSE)[number]>('whose', 'all', WHOSE);
  const today = todayOf(facts, room.units);
  const all = [...today.due, ...today.ahead];
  const mine = all.filter(({ assignedTo }) => assignedTo?.id === room.accountId);
  const shown = whose === 'mine' ? mine : all;
  const groups = grouped(shown, ({ lateDays }) => whenOf(lateDays));
  return (
    <>
      <Toolbar>
        <Segmented
          label="Whose"
          as="tabs"
          value={whose}
          onChange={setWhose}
          choices={[
            { value: 'all', word: `All ${all.length}` },
            { value: 'mine', word: `Mine ${mine.length}` },
          ]}
        />
      </Toolbar>
      {shown.length === 0 ? <NothingDue mine={whose === 'mine'} /> : null}
      {WHENS.map((when) => (
        <Group key={when} title={WHEN_WORDS[when]} due={groups.get(when) ?? []} today={facts.today} />
      ))}
      <SettledRows settled={today.settled} />
    </>
  );
}

function Group({ title, due, today }: { title: string; due: Due[]; today: string }) {
  if (due.length === 0) return null;
  return (
    <Section title={title} aside={String(due.length)}>
      <Rows label={title}>
        <VirtualList items={due} keyOf={({ key }) => key} estimate={76}>
          {(one) => <DueRow due={one} today={today} margin="day" />}
        </VirtualList>
      </Rows>
    </Section>
  );
}

function NothingDue({ mine }: { mine: boolean }) {
  const room = useRoom();
  return (
    <EmptyState
      small
      title={mine ? 'Nothing is given to you' : 'Nothing is due'}
      words="Checks, head counts and water come by themselves from what is recorded. Anything else you add."
    >
      {may(room.role, 'task:write') ? <Button label="Add a task" small href={`/r/${room.id}/tasks/new`} /> : null}
    </EmptyState>
  );
}
