import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import type { BroodRow } from '@/shared/broods/contract';
import { ageWords, daysBetween } from '@/shared/days';
import { formatLength } from '@/shared/unitWords';

/** Every brood the colony ever had, newest first. */
export function BroodsOf({ broods }: { broods: readonly BroodRow[] }) {
  const room = useRoom();
  if (broods.length === 0) return null;
  const newest = broods.toSorted((a, b) => (a.startedOn < b.startedOn ? 1 : -1));
  return (
    <Section title="Broods" aside={String(broods.length)}>
      <Rows>
        {newest.map(({ id, code, opened, heads, spawnLatest, lastSample }) => (
          <Row
            key={id}
            href={`/r/${room.id}/broods/${id}`}
            label={`${code}, ${Math.round(heads)} heads`}
            figure={opened === null ? '–' : String(Math.round(heads))}
            unit={opened === null ? 'not yet' : 'heads'}
            title={<Code>{code}</Code>}
            note={`${ageWords(daysBetween(spawnLatest, room.today))}${opened === null ? '' : ` · ${opened} at the start`}`}
            {...(lastSample ? { trailing: formatLength(lastSample.meanTenthsMm, room.units) } : {})}
          />
        ))}
      </Rows>
    </Section>
  );
}
