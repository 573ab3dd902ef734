import { View } from 'react-native';
import { StepKey } from '@/components/form/StepKey';
import { space } from '@/components/theme/space';
import { Figure } from '@/components/ui/Figure';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import type { SpeciesProfile } from '@/shared/species/profile';
import { LIMITS, type Plan } from './usePlan';

const LIMIT_WORDS = { '0.0625': '0.063', '0.125': '0.125', '0.25': '0.250', '1': 'None' };
const MOST_YEARS = 20;

/** How many of each sex, how related their young may be, and how old the fish. */
export function LimitsPart({ plan, profile }: { plan: Plan; profile: SpeciesProfile | null }) {
  const { counts, limit, years } = plan;
  return (
    <Section title="Limits">
      <View style={{ gap: space[3] }}>
        <Counter word="Males" count={counts.males} onCount={(n) => plan.setCount('males', n)} />
        <Counter word="Females" count={counts.females} onCount={(n) => plan.setCount('females', n)} />
        {profile ? (
          <Text size="small" tone="soft">
            {`${profile.name}: a group of at least ${profile.minGroup.value}, ${profile.femalesPerMale.value} females for each male. ${profile.minGroup.source}.`}
          </Text>
        ) : null}
        <View style={{ gap: space[1] }}>
          <Text size="small" semi>
            Highest F of the young
          </Text>
          <Segmented
            label="Highest F of the young"
            choices={LIMITS.map((value) => ({ value, word: LIMIT_WORDS[value] }))}
            value={limit}
            onChange={plan.setLimit}
          />
          <Text size="small" tone="soft">
            0.063 are first cousins’ young, 0.125 half sibs’, 0.250 full sibs’.
          </Text>
        </View>
        <Counter
          word="Not older than, years"
          count={years}
          none="any age"
          onCount={(n) => plan.setYears(n < 1 || n > MOST_YEARS ? null : n)}
        />
      </View>
    </Section>
  );
}

type CounterProps = { word: string; count: number | null; none?: string; onCount: (count: number) => void };

function Counter({ word, count, none, onCount }: CounterProps) {
  const least = none ? 0 : 1;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space[3] }}>
      <Text style={{ flexGrow: 1, flexShrink: 1 }}>{word}</Text>
      <StepKey
        icon="minus"
        label={`${word}: one less`}
        unavailable={(count ?? 0) <= least}
        onPress={() => onCount((count ?? 1) - 1)}
      />
      <View style={{ minWidth: 56, alignItems: 'center' }} aria-live="polite">
        {count === null ? (
          <Text size="small" tone="soft" align="center">
            {none}
          </Text>
        ) : (
          <Figure size="s">{String(count)}</Figure>
        )}
      </View>
      <StepKey icon="plus" label={`${word}: one more`} onPress={() => onCount((count ?? 0) + 1)} />
    </View>
  );
}
