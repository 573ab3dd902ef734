import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { PROVENANCE_WORDS } from '@/shared/strains/contract';
import type { StrainTold } from './queries';

/** Fish that came in together: their founders may be sibs, and may be in quarantine. */
export function LotRows({ lots }: { lots: StrainTold['lots'] }) {
  const { today } = useRoom();
  if (lots.length === 0) return null;
  return (
    <Section title="Lots that came in" aside={String(lots.length)}>
      <Rows>
        {lots.map((lot) => (
          <Row
            key={lot.id}
            figure={lot.heads === null ? '?' : String(lot.heads)}
            unit="fish"
            title={`${PROVENANCE_WORDS[lot.provenance]}${lot.fromWhom ? `, ${lot.fromWhom}` : ''}`}
            trailing={formatDate(lot.receivedOn)}
            note={[
              lot.generation === null ? null : `F${lot.generation}`,
              lot.deadOnArrival > 0 ? `${lot.deadOnArrival} dead on arrival` : null,
              lot.mayBeSibs ? 'may be sibs' : null,
              lot.quarantineUntil && lot.quarantineUntil >= today
                ? `quarantine until ${formatDate(lot.quarantineUntil)}`
                : null,
              lot.papers,
            ]
              .filter(Boolean)
              .join(' · ')}
          >
            {lot.note ? (
              <Text size="small" tone="soft">
                {lot.note}
              </Text>
            ) : null}
          </Row>
        ))}
      </Rows>
    </Section>
  );
}
