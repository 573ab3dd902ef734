import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { type AuditLine, listAudit } from '@/shared/audit/contract';
import { formatDay } from '@/shared/days';
import { changeWords } from './changeWords';
import { atTime, byDay } from './instants';
import { Paged } from './Paged';

const changesQuery = (roomId: string) =>
  infiniteQueryOptions({
    queryKey: [roomId, 'trail', 'changes'],
    queryFn: ({ pageParam, signal }) =>
      call(listAudit, { params: { roomId }, query: pageParam ? { before: pageParam } : {}, signal }),
    initialPageParam: '',
    getNextPageParam: ({ lines, more }) => (more ? lines.at(-1)?.id : undefined),
  });

/** What was changed or removed besides the entries: settings, members, tanks, strains, prices. */
export function ChangeRows() {
  const room = useRoom();
  const state = useInfiniteQuery(changesQuery(room.id));
  const lines = state.data?.pages.flatMap((page) => page.lines) ?? [];
  return (
    <Paged
      state={state}
      isEmpty={lines.length === 0}
      emptyTitle="Nothing changed yet"
      emptyWords="Changes of what was recorded before stand here, with what it was and who changed it."
    >
      {byDay(lines, ({ at }) => at, room.timeZone).map(([day, ofDay]) => (
        <Section key={day} title={formatDay(day, room.today)} aside={`${ofDay.length}`}>
          <Rows>
            {ofDay.map((line) => (
              <ChangeRow key={line.id} line={line} />
            ))}
          </Rows>
        </Section>
      ))}
    </Paged>
  );
}

function ChangeRow({ line }: { line: AuditLine }) {
  const room = useRoom();
  const { title, details } = changeWords(line);
  return (
    <Row
      margin={<Text size="small">{atTime(line.at, room.timeZone)}</Text>}
      title={title}
      note={[line.by?.name ?? 'The program', ...details].join(' · ')}
    />
  );
}
