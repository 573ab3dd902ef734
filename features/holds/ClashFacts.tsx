import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { dayWords } from '@/shared/days';
import { clockOf } from '@/shared/holds/clockOf';
import { dayRangeWords } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { PreviewBars } from './HoldPreview';

type Props = {
  spawn: { spawnSeen: boolean; spawnEarliest: string; spawnLatest: string };
  sires: string[];
  /** Whose species and water both records share. */
  hold: HoldRow;
};

/** One of two records of the same hold: since when, by whom, and what its days come to. */
export function ClashFacts({ spawn, sires, hold }: Props) {
  const { today } = useRoom();
  const clock = clockOf(hold.clock, spawn, today)?.clock;
  return (
    <View style={styles.facts}>
      <Fact name="Spawn">
        <Text strong>{spawnWords(spawn, today)}</Text>
      </Fact>
      <Fact name="Sires">{sires.length > 0 ? <Code>{sires.join(', ')}</Code> : <Text>not known</Text>}</Fact>
      {clock ? <PreviewBars clock={clock} plan={hold.plan} /> : null}
    </View>
  );
}

/** "seen Thu 23 Apr", "9–12 May, not seen". */
export function spawnWords({ spawnSeen, spawnEarliest, spawnLatest }: Props['spawn'], today: string): string {
  if (spawnSeen) return `seen ${dayWords(spawnEarliest, today)}`;
  if (spawnEarliest === spawnLatest) return `${dayWords(spawnLatest, today)}, not seen`;
  const year = spawnLatest.slice(0, 4);
  const days = dayRangeWords(spawnEarliest, spawnLatest);
  return `${year === today.slice(0, 4) ? days : `${days} ${year}`}, not seen`;
}

function Fact({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <View style={styles.fact}>
      <Text tone="soft" style={styles.name}>
        {name}
      </Text>
      <View style={styles.value}>{children}</View>
    </View>
  );
}

const styles = StyleSheet.create({
  facts: { gap: space[2] },
  fact: { flexDirection: 'row', gap: space[3] },
  name: { width: 56 },
  value: { flexGrow: 1, flexShrink: 1 },
});
