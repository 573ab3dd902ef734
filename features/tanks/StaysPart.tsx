import { Code } from '@/components/ui/Code';
import { Section } from '@/components/ui/Section';
import { Table } from '@/components/ui/Table';
import { Text } from '@/components/ui/Text';
import { formatDate } from '@/shared/days';
import type { TankTold } from './queries';

const COLUMNS = [
  { key: 'who', word: 'Who', grow: 1.3 },
  { key: 'from', word: 'From', grow: 1 },
  { key: 'until', word: 'Until', grow: 1 },
];

/** Who lived in it before: an illness or a surprise brood is traced back here. */
export function StaysPart({ stays }: { stays: TankTold['stays'] }) {
  const past = stays.filter(({ untilDay }) => untilDay !== null);
  if (past.length === 0) return null;
  return (
    <Section title="Lived in it before" aside={String(past.length)}>
      <Table
        label="Lived in it before"
        columns={COLUMNS}
        rows={past.map(({ resident, fromDay, untilDay }) => ({
          key: `${resident.id} ${fromDay}`,
          cells: {
            who: resident.code ? <Code>{resident.code}</Code> : <Text>Not told apart</Text>,
            from: formatDate(fromDay),
            until: untilDay ? formatDate(untilDay) : '',
          },
        }))}
      />
    </Section>
  );
}
