import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { DiversityBars } from '@/components/chart/DiversityBars';
import { StepKey } from '@/components/form/StepKey';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Figure } from '@/components/ui/Figure';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useUrlWord } from '@/hooks/useUrlWord';
import { ColonySheet } from './ColonySheet';
import { type ColonyFacts, forecastOf } from './colonyFacts';

const MOST_GENERATIONS = 20;
const FIRST = 5;

type Props = { colonies: readonly ColonyFacts[]; chosen: boolean };

/** Gene diversity and effective size of each colony, and what is left after so many generations as it is kept now. */
export function ColonyDiversity({ colonies, chosen }: Props) {
  const [word, setWord] = useUrlWord<string>('generations', String(FIRST));
  const [open, setOpen] = useState<string | null>(null);
  const generations = /^\d{1,2}$/.test(word) ? Math.min(MOST_GENERATIONS, Number(word)) : FIRST;
  const shown = colonies.find(({ id }) => id === open);
  return (
    <Section title="What each colony keeps" aside={chosen ? 'as one colony' : String(colonies.length)}>
      <Stepper value={generations} onChange={(next) => setWord(String(next))} />
      <Rows bleed label="Colonies">
        {colonies.map((facts) => (
          <ColonyRow key={facts.id} facts={facts} generations={generations} onPress={() => setOpen(facts.id)} />
        ))}
      </Rows>
      {colonies.length === 0 ? <Text tone="soft">None of these fish is in a colony.</Text> : null}
      {shown ? <ColonySheet facts={shown} generations={generations} onClose={() => setOpen(null)} /> : null}
    </Section>
  );
}

function Stepper({ value, onChange }: { value: number; onChange: (value: number) => void }) {
  return (
    <View role="group" aria-label="Generations ahead" style={styles.stepper}>
      <StepKey icon="minus" label="One generation less" unavailable={value <= 1} onPress={() => onChange(value - 1)} />
      <View style={styles.count} role="status" aria-label={`After ${value} generations`}>
        <Figure>{String(value)}</Figure>
        <Text size="small" tone="soft">
          {value === 1 ? 'generation on' : 'generations on'}
        </Text>
      </View>
      <StepKey
        icon="plus"
        label="One generation more"
        unavailable={value >= MOST_GENERATIONS}
        onPress={() => onChange(value + 1)}
      />
    </View>
  );
}

type RowProps = { facts: ColonyFacts; generations: number; onPress: () => void };

function ColonyRow({ facts, generations, onPress }: RowProps) {
  const { code, diversity, size } = facts;
  const forecast = forecastOf(facts, generations);
  const later = forecast?.at(-1);
  const sizeWords =
    size.size === null ? `Effective size not known. ${size.because}` : `Effective size ${size.size.toFixed(1)}`;
  const after = later === undefined ? 'no forecast' : `${later.toFixed(2)} after ${generations}`;
  return (
    <Row
      onPress={onPress}
      label={`${code}: gene diversity ${diversity.toFixed(2)}, ${after} generations. ${sizeWords}. What it rests on`}
      figure={diversity.toFixed(2).replace(/^0/, '')}
      unit="now"
      title={<Code>{code}</Code>}
      note={`${sizeWords}${size.size === null ? '' : `, ${size.word.toLowerCase()}`}`}
      trailing={<Text strong>{after}</Text>}
    >
      {forecast ? (
        <View style={styles.bars}>
          <DiversityBars
            values={forecast}
            sentence={`Gene diversity ${forecast.map((one) => one.toFixed(2)).join(', ')}`}
          />
        </View>
      ) : null}
    </Row>
  );
}

const styles = StyleSheet.create({
  stepper: { flexDirection: 'row', alignItems: 'center', gap: space[3], paddingBottom: space[3] },
  count: { flexDirection: 'row', alignItems: 'baseline', gap: space[2], minWidth: 150, justifyContent: 'center' },
  bars: { marginTop: 6 },
});
