import { View } from 'react-native';
import type * as z from 'zod/mini';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import type { ImportAsk, previewImport } from '@/shared/transfer/contract';
import { IMPORT_FIELDS } from '@/shared/transfer/importFields';

type Read = z.output<typeof previewImport.output>;
type Props = { ask: ImportAsk; read: Read; onChange: (ask: ImportAsk) => void };

const NONE = ' ';

/** Which column of the file each field is read from, as guessed or as last time; every one can be changed. */
export function ColumnMatcher({ ask, read, onChange }: Props) {
  const example = (header: string) => read.sample.map((row) => row[read.headers.indexOf(header)] ?? '').join(', ');
  const options = [
    { value: NONE, word: 'not in the file' },
    ...[...new Set(read.headers)]
      .filter(Boolean)
      .map((header) => ({ value: header, word: header, note: example(header) })),
  ];
  return (
    <Section title="Columns" aside={`${read.rows} lines`}>
      <View style={{ gap: space[3], paddingTop: space[3] }}>
        {IMPORT_FIELDS[ask.kind].map(({ name, word, needed }) => (
          <View key={name} style={{ gap: space[1] }}>
            <Text size="small" tone={read.missing.includes(name) ? 'trouble' : 'soft'}>
              {needed ? `${word} (needed)` : word}
            </Text>
            <Select
              label={word}
              options={options}
              value={read.columns[name] ?? NONE}
              invalid={read.missing.includes(name)}
              onChange={(value) =>
                onChange({ ...ask, columns: { ...read.columns, [name]: value === NONE ? null : value } })
              }
            />
          </View>
        ))}
        <Units ask={ask} onChange={(units) => onChange({ ...ask, columns: read.columns, units })} />
      </View>
    </Section>
  );
}

/** Only those that the file can hold. */
function Units({ ask, onChange }: { ask: ImportAsk; onChange: (units: ImportAsk['units']) => void }) {
  const { kind, units } = ask;
  if (kind === 'samples')
    return (
      <Segmented
        label="Lengths are in"
        value={units.length}
        onChange={(length) => onChange({ ...units, length })}
        choices={[
          { value: 'mm', word: 'mm' },
          { value: 'cm', word: 'cm' },
          { value: 'in', word: 'inches' },
        ]}
      />
    );
  if (kind !== 'tanks') return null;
  return (
    <>
      <Segmented
        label="Volumes are in"
        value={units.volume}
        onChange={(volume) => onChange({ ...units, volume })}
        choices={[
          { value: 'L', word: 'litres' },
          { value: 'usGal', word: 'US gal' },
          { value: 'impGal', word: 'imp gal' },
        ]}
      />
      <Segmented
        label="Heaters are in"
        value={units.temperature}
        onChange={(temperature) => onChange({ ...units, temperature })}
        choices={[
          { value: 'C', word: '°C' },
          { value: 'F', word: '°F' },
        ]}
      />
    </>
  );
}
