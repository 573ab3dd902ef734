import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { fromToday } from '@/shared/days';
import type { Resident } from '@/shared/tanks/contract';

/** Who lives in it today; a batch leads to its brood's page by its batch. */
export function ResidentRows({ residents }: { residents: Resident[] }) {
  const heads = residents.reduce((sum, one) => sum + one.heads, 0);
  return (
    <Section title="In it now" aside={residents.length > 0 ? `${heads} fish` : 'empty'}>
      <Rows>
        {residents.map((resident) => (
          <ResidentRow key={resident.id} resident={resident} />
        ))}
      </Rows>
    </Section>
  );
}

const PLACE_OF = { colony: 'colonies', fish: 'fish', batch: 'batches' } as const;
const UNIT_OF = { colony: 'fish', fish: 'fish', batch: 'heads' } as const;

function ResidentRow({ resident }: { resident: Resident }) {
  const room = useRoom();
  const { thing, id, code, displayName, heads, since } = resident;
  return (
    <Row
      href={`/r/${room.id}/${PLACE_OF[thing]}/${id}`}
      label={`${code}, ${heads} ${UNIT_OF[thing]}`}
      figure={String(heads)}
      unit={UNIT_OF[thing]}
      title={code ? <Code>{code}</Code> : 'Not told apart'}
      note={
        displayName ? (
          <Text size="small" tone="soft" italic cut>
            {displayName}
          </Text>
        ) : undefined
      }
      trailing={`since ${fromToday(since, room.today)}`}
    />
  );
}
