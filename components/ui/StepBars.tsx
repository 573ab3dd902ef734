import { StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from './Text';

type Props = {
  /** "Reserved", "Deposit paid", "Ready", "Collected". */
  steps: readonly string[];
  /** From 0; `steps.length` when all are done. */
  current: number;
  /** In a row of a list: short bars with the current word beside them. */
  small?: boolean;
};

/** Steps of an order; those done are solid, the current one stands taller. */
export function StepBars({ steps, current, small = false }: Props) {
  const theme = useTheme();
  const word = steps[Math.min(current, steps.length - 1)] ?? '';
  const fill = (i: number) => ({
    backgroundColor: theme.ink,
    borderColor: theme.ink,
    borderWidth: 0,
    ...(i <= current ? {} : hollow(theme.control)),
  });
  return (
    <View
      role="img"
      aria-label={`Step ${Math.min(current + 1, steps.length)} of ${steps.length}, ${word}`}
      style={small ? styles.smallLine : styles.line}
    >
      {steps.map((step, i) =>
        small ? (
          <View key={step} style={[styles.smallBar, fill(i)]} />
        ) : (
          <View key={step} style={styles.step}>
            <View style={[fill(i), { height: i === current ? 20 : 12, marginTop: i === current ? 0 : 8 }]} />
            <Text
              size="label"
              strong={i === current}
              tone={i <= current ? 'ink' : 'soft'}
              style={styles.word}
              aria-hidden
            >
              {step}
            </Text>
          </View>
        ),
      )}
      {small ? (
        <Text size="small" style={styles.smallWord} aria-hidden>
          {word}
        </Text>
      ) : null}
    </View>
  );
}

const hollow = (borderColor: string) => ({ backgroundColor: 'transparent', borderColor, borderWidth: line.control });

const styles = StyleSheet.create({
  line: { flexDirection: 'row', gap: 4 },
  step: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
  word: { marginTop: 6 },
  smallLine: { flexDirection: 'row', alignItems: 'center', gap: 3 },
  smallBar: { width: 22, height: 8 },
  smallWord: { marginLeft: 6 },
});
