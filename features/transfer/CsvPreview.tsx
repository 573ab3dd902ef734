import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { ImportAsk, ImportLine } from '@/shared/transfer/contract';
import { ColumnMatcher } from './ColumnMatcher';
import { useImports, usePreview } from './csvQueries';

type Props = { ask: ImportAsk; onChange: (ask: ImportAsk) => void; onDone: (line: ImportLine) => void };

/** How the file was read, line by line what is wrong, and the button once nothing is. */
export function CsvPreview({ ask, onChange, onDone }: Props) {
  const room = useRoom();
  const { data, error, isFetching } = usePreview(room.id, ask);
  const { run } = useImports(room.id);
  if (error) return <Notice tone="act" alert title="Not read" words={error.message} />;
  if (!data) return <Loading label="Reading the file" rows={4} />;
  const { rows, bad, badRows, missing, counts } = data;
  const ready = missing.length === 0 && badRows === 0;
  return (
    <View style={{ gap: space[4] }}>
      <ColumnMatcher ask={ask} read={data} onChange={onChange} />
      {counts.length > 0 ? (
        <Text tone="soft">{`Head counts by month: ${counts.join(', ')}. A month without a day counts as its last day.`}</Text>
      ) : null}
      {badRows > 0 ? (
        <Section title="What needs another look" aside={`${badRows} of ${rows} lines`}>
          <Rows>
            {bad.map(({ row, column, value, why }) => (
              <Row
                key={`${row} ${column} ${why}`}
                figure={String(row)}
                unit="line"
                title={`${column}: ${value === '' ? 'empty' : value}`}
                note={why}
              />
            ))}
          </Rows>
        </Section>
      ) : null}
      {run.error ? <Notice tone="act" alert title="Nothing was brought in" words={run.error.message} /> : null}
      <Button
        kind="primary"
        label={`Bring in ${rows} ${rows === 1 ? 'line' : 'lines'}`}
        busy={run.isPending || isFetching}
        busyLabel={isFetching ? 'Reading' : 'Bringing them in'}
        disabledBecause={ready ? null : whyNot(missing, badRows)}
        onPress={() => run.mutate({ ...ask, columns: data.columns }, { onSuccess: onDone })}
      />
    </View>
  );
}

const whyNot = (missing: string[], badRows: number): string =>
  missing.length > 0
    ? 'Say above which column holds what is needed.'
    : `${badRows} ${badRows === 1 ? 'line needs' : 'lines need'} another look: mend the file, and choose it again.`;
