import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';

/** Where its fish swim. Shown when there is something to say: several tanks, or a batch shared with another brood. */
export function BatchRows({ batches }: { batches: BatchTold[] }) {
  const { id: roomId } = useRoom();
  const here = batches.filter(({ tank, balance, lines }) => tank && (balance > 0 || lines.length === 0));
  const mixed = here.some(({ sources }) => sources.length > 1);
  if (here.length < 2 && !mixed) return null;
  return (
    <Section title="Batches" aside={mixed ? 'shared ones count by heads' : String(here.length)}>
      <Rows>
        {here.map((batch) => (
          <Row
            key={batch.id}
            href={`/r/${roomId}/tanks/${batch.tank?.id}`}
            label={`${batch.balance} heads in ${batch.tank?.code}`}
            figure={String(batch.balance)}
            unit="heads"
            title={<Code>{batch.tank?.code ?? ''}</Code>}
            note={
              batch.sources.length > 1 ? (
                <Text size="small" tone="soft">
                  {batch.sources.map(({ code, share }) => `${code} ${Math.round(share * 100)} %`).join(', ')}
                </Text>
              ) : undefined
            }
          />
        ))}
      </Rows>
    </Section>
  );
}
