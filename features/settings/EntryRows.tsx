import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { type EntryLine, listEntries } from '@/shared/record/contract';
import { atTime, byDay } from './instants';
import { Paged } from './Paged';

const PAGE = 60;

const entriesQuery = (roomId: string) =>
  infiniteQueryOptions({
    queryKey: [roomId, 'trail', 'entries'],
    queryFn: ({ pageParam, signal }) =>
      call(listEntries, {
        params: { roomId },
        query: { limit: String(PAGE), ...(pageParam ? { before: pageParam } : {}) },
        signal,
      }),
    initialPageParam: '',
    getNextPageParam: ({ entries }) => (entries.length < PAGE ? undefined : entries.at(-1)?.receivedAt),
  });

/** What Record wrote, undone entries included, by the day it was sent. */
export function EntryRows() {
  const room = useRoom();
  const state = useInfiniteQuery(entriesQuery(room.id));
  const entries = state.data?.pages.flatMap((page) => page.entries) ?? [];
  return (
    <Paged
      state={state}
      isEmpty={entries.length === 0}
      emptyTitle="Nothing recorded yet"
      emptyWords="Every hold, count, sample and water test stands here, with who wrote it and when."
    >
      {byDay(entries, ({ receivedAt }) => receivedAt, room.timeZone).map(([day, ofDay]) => (
        <Section key={day} title={formatDay(day, room.today)} aside={`${ofDay.length}`}>
          <Rows>
            {ofDay.map((entry) => (
              <EntryRow key={entry.id} entry={entry} />
            ))}
          </Rows>
        </Section>
      ))}
    </Paged>
  );
}

function EntryRow({ entry }: { entry: EntryLine }) {
  const room = useRoom();
  const about = entry.onDay === room.today ? '' : `, about ${formatDay(entry.onDay, room.today)}`;
  return (
    <Row
      margin={<Text size="small">{atTime(entry.receivedAt, room.timeZone)}</Text>}
      title={entry.said}
      note={`${entry.by.name}${about}`}
      trailing={entry.undone ? `undone by ${entry.undone.by}` : undefined}
    />
  );
}
