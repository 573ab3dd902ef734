import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import type { Clock } from '@/shared/holds/clock';
import { clockBasis, spawnDoubt } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { HoldBars } from './HoldRows';

type Props = { hold: HoldRow; clock: Clock; basedOn: number };

/** The days as bars, what their colours mean, and, a tap away, what the dates rest on. */
export function HoldClockPart({ hold, clock, basedOn }: Props) {
  const [shown, setShown] = useState(false);
  const doubt = spawnDoubt(clock);
  return (
    <View style={styles.part}>
      <HoldBars hold={hold} clock={clock} size="page" />
      <Legend clock={clock} checked={hold.checkedOn.length > 0} />
      {shown ? (
        <Text size="small" tone="soft" style={styles.basis}>
          {`${clockBasis(clock, basedOn)}${doubt ? ` ${doubt}: the release range covers all of it.` : ''}`}
        </Text>
      ) : (
        <TextLink label="What the dates rest on" onPress={() => setShown(true)} />
      )}
    </View>
  );
}

function Legend({ clock, checked }: { clock: Clock; checked: boolean }) {
  const theme = useTheme();
  const stages = [
    ['egg', 'egg'],
    ['wriggler', 'wriggler'],
    ['fry', clock.kind === 'guards' ? 'free-swimming' : 'fry'],
  ] as const;
  return (
    <View aria-hidden style={styles.legend}>
      {stages.map(([stage, word]) => (
        <View key={stage} style={styles.key}>
          <View style={[styles.bar, { backgroundColor: theme.stage[stage] }]} />
          <Text size="small" tone="soft">
            {word}
          </Text>
        </View>
      ))}
      {checked ? (
        <View style={styles.key}>
          <View style={[styles.dot, { backgroundColor: theme.ink }]} />
          <Text size="small" tone="soft">
            checked
          </Text>
        </View>
      ) : null}
    </View>
  );
}

const styles = StyleSheet.create({
  part: { marginBottom: space[3] },
  legend: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space[5], rowGap: space[1], marginTop: space[3] },
  key: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  bar: { width: 7, height: 16 },
  dot: { width: 6, height: 6 },
  basis: { marginTop: space[3], maxWidth: 560 },
});
