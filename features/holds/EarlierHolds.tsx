import { Section } from '@/components/ui/Section';
import { Table } from '@/components/ui/Table';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { daysBetween, formatDate } from '@/shared/days';
import { OUTCOME_WORDS } from '@/shared/holds/entries';
import type { HoldTold } from './queries';

const COLUMNS = [
  { key: 'spawned', word: 'Spawned', grow: 1.4 },
  { key: 'days', word: 'Days', right: true, grow: 0.6 },
  { key: 'end', word: 'End', grow: 1.3 },
  { key: 'fry', word: 'Fry', right: true, grow: 0.6 },
];

/** How her holds went before. */
export function EarlierHolds({ holds }: { holds: HoldTold['earlier'] }) {
  const { id: roomId } = useRoom();
  return (
    <Section title="Her earlier holds" aside={String(holds.length)}>
      {holds.length === 0 ? (
        <Text tone="soft">None recorded.</Text>
      ) : (
        <Table
          label="Her earlier holds"
          columns={COLUMNS}
          rows={holds.map(({ id, outcome, spawnLatest, endedOn, fry }) => ({
            key: id,
            cells: {
              spawned: (
                <TextLink
                  label={formatDate(spawnLatest)}
                  describe={`Hold of ${formatDate(spawnLatest)}`}
                  href={`/r/${roomId}/holds/${id}`}
                />
              ),
              days: endedOn ? daysBetween(spawnLatest, endedOn) + 1 : '',
              end: outcome ? OUTCOME_WORDS[outcome] : 'Holding now',
              fry: (
                <Text strong align="right">
                  {endedOn === null ? '' : String(fry ?? (outcome === 'stripped' || outcome === 'released' ? '?' : 0))}
                </Text>
              ),
            },
          }))}
        />
      )}
    </Section>
  );
}
