import { useQuery } from '@tanstack/react-query';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { trustWords } from '@/shared/sheets/importWords';
import { importedListQuery } from './importQueries';

/** Sheets of other fishrooms that were taken in, newest first. */
export function ImportedList() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(importedListQuery(room.id));
  if (!data)
    return error ? (
      <ErrorState title="The sheets could not be loaded" words={error.message} onRetry={() => void refetch()} />
    ) : (
      <Loading label="Loading the sheets" />
    );
  if (data.length === 0)
    return (
      <EmptyState
        small
        title="No sheet taken in yet"
        words="Fish that come with a lineage sheet keep their ancestors: kinship is then known across fishrooms."
      />
    );
  return (
    <Rows label="Sheets taken in">
      <VirtualList items={data} keyOf={({ id }) => id}>
        {(sheet) => (
          <Row
            href={`/r/${room.id}/sheets/imported/${sheet.id}`}
            label={`Sheet ${sheet.number} of ${sheet.room}, ${sheet.subject}, ${trustWords(sheet).word}`}
            figure={String(sheet.fish.length)}
            unit="fish"
            title={<Code>{sheet.number}</Code>}
            state={trustWords(sheet).word}
            note={`${sheet.subject} · ${sheet.room} · ${formatDate(sheet.takenInOn)}`}
          />
        )}
      </VirtualList>
    </Rows>
  );
}
