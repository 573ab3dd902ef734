import { KeyValues } from '@/components/ui/KeyValues';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { Plan } from './usePlan';

/** The plan beside the colony that the keeper has now, figure by figure. */
export function NowPart({ plan }: { plan: Plan }) {
  const { now, figures } = plan;
  const [first] = figures;
  if (!now.code || !now.figures || !first) return null;
  const line = (key: string, planned: number, today: number) => ({
    key,
    value: `${planned.toFixed(3)}, now ${today.toFixed(3)}`,
  });
  const worst = Math.max(...figures.map((one) => one?.highest ?? 0));
  return (
    <Section title="Beside what you have now" aside={now.code}>
      <KeyValues
        pairs={[
          line('Highest F of a pair', worst, now.figures.highest),
          line('Mean F of the young', first.meanFryInbreeding, now.figures.meanFryInbreeding),
          line('Gene diversity of the young', first.geneDiversity, now.figures.geneDiversity),
        ]}
      />
      <Text size="small" tone="soft">
        Expected values over uncertain parents. A low F from a pedigree that is not known is not a low F.
      </Text>
    </Section>
  );
}
