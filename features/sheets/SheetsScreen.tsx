import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { formatDate } from '@/shared/days';
import { may } from '@/shared/roles';
import { ImportedList } from './ImportedList';
import { sheetsQuery } from './queries';

const STATE_WORDS = { valid: 'Valid', replaced: 'Replaced', withdrawn: 'Withdrawn' };

/** Every sheet that was issued, newest first, and those taken in; `tabs` are the Lineage place's. */
export function SheetsScreen({ tabs }: { tabs: ReactNode }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(sheetsQuery(room.id));
  const [show, setShow] = useUrlWord('show', 'issued', ['issued', 'in']);
  return (
    <Screen title="Lineage" fixed={tabs} measure>
      <View style={styles.head}>
        <View style={styles.which}>
          <Segmented
            label="Which sheets"
            as="tabs"
            choices={[
              { value: 'issued', word: 'Issued' },
              { value: 'in', word: 'Taken in' },
            ]}
            value={show}
            onChange={setShow}
          />
        </View>
        {may(room.role, 'stock:write') ? (
          <Button icon="download" label="Take a sheet in" href={`/r/${room.id}/sheets/import`} />
        ) : null}
      </View>
      {show === 'in' ? (
        <ImportedList />
      ) : !data ? (
        error ? (
          <ErrorState title="The sheets could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading the sheets" />
        )
      ) : data.length === 0 ? (
        <EmptyState
          title="No sheet issued yet"
          words="Open a fish or a brood, then Lineage sheet. A sheet is also issued when an order is collected."
        />
      ) : (
        <Rows label="Lineage sheets">
          <VirtualList items={data} keyOf={({ id }) => id}>
            {({ id, number, subject, heads, issuedOn, by, state }) => (
              <Row
                href={`/r/${room.id}/sheets/${id}`}
                label={`Sheet ${number}, ${subject.code}, ${STATE_WORDS[state]}`}
                figure={String(heads)}
                unit="fish"
                title={<Code>{number}</Code>}
                state={STATE_WORDS[state]}
                note={`${subject.code} · ${formatDate(issuedOn)}, ${by}`}
              />
            )}
          </VirtualList>
        </Rows>
      )}
    </Screen>
  );
}

const styles = StyleSheet.create({
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: space[3],
    marginTop: space[3],
    marginBottom: space[4],
  },
  which: { width: 240 },
});
