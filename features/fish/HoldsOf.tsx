import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { daysHeld } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { OUTCOME_WORDS } from '@/shared/holds/entries';

/** How its holds went, newest first. */
export function HoldsOf({ holds }: { holds: readonly HoldRow[] }) {
  const room = useRoom();
  if (holds.length === 0) return null;
  const newest = holds.toSorted((a, b) => (a.spawnLatest < b.spawnLatest ? 1 : -1));
  return (
    <Section title="Holds" aside={String(holds.length)}>
      <Rows>
        {newest.map((hold) => (
          <Row
            key={hold.id}
            href={`/r/${room.id}/holds/${hold.id}`}
            label={`Hold of ${formatDate(hold.spawnLatest)}, ${hold.outcome ? OUTCOME_WORDS[hold.outcome] : 'holding now'}`}
            figure={String(daysHeld(hold, hold.endedOn ?? room.today))}
            unit="days"
            title={hold.outcome ? OUTCOME_WORDS[hold.outcome] : 'Holding now'}
            note={`Spawned by ${formatDate(hold.spawnLatest)}`}
            {...(hold.brood ? { state: <Code>{hold.brood.code}</Code> } : {})}
          />
        ))}
      </Rows>
    </Section>
  );
}
