import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { type Day, daysBetween, dayWords } from '@/shared/days';
import type { TodayFacts } from '@/shared/today/facts';

/** Treatments and quarantines that run, by tank. */
export function TreatmentRows({
  care,
  tanks,
  today,
}: {
  care: TodayFacts['care'];
  tanks: TodayFacts['tanks'];
  today: Day;
}) {
  const { id: roomId } = useRoom();
  if (care.length === 0) return null;
  return (
    <Section title="Treatments" aside={String(care.length)}>
      <Rows>
        {care.map(({ id, tankId, kind, what, why, onDay, untilDay }) => {
          const code = tanks.find((tank) => tank.id === tankId)?.code ?? '';
          const name = kind === 'quarantine' ? 'Quarantine' : (what ?? 'Treatment');
          return (
            <Row
              key={id}
              href={`/r/${roomId}/tanks/${tankId}`}
              label={`${name}, ${code}`}
              figure={String(daysBetween(onDay, today) + 1)}
              unit="day"
              title={
                <Text strong>
                  {name}, <Code>{code}</Code>
                </Text>
              }
              note={why ?? undefined}
              trailing={untilDay ? `until ${dayWords(untilDay, today)}` : 'no end set'}
            />
          );
        })}
      </Rows>
    </Section>
  );
}
