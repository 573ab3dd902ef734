import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Figure } from '@/components/ui/Figure';
import { Icon } from '@/components/ui/Icon';
import { Text } from '@/components/ui/Text';

export type ReadoutProps = {
  /** As typed so far. */
  value: string;
  unit: string;
  /** "Fish 12". */
  title: string;
  /** "4 more makes 15". */
  note?: string;
  /** The last five, oldest first. */
  tape?: readonly string[];
  /** "82 mm is far above the others. Keep it?" Next keeps it. */
  question?: string | null;
};

/** What is being entered, large, with the tape of what went before. */
export function KeypadReadout({ value, unit, title, note, tape = [], question }: ReadoutProps) {
  const theme = useTheme();
  return (
    <View style={styles.readout}>
      <View style={styles.left}>
        <Text size="title" strong>
          {title}
        </Text>
        {question ? (
          <View style={styles.question}>
            <Icon name="warn" size={20} tone="trouble" />
            <Text role="alert" size="small" semi tone="trouble" style={styles.shrink}>
              {question}
            </Text>
          </View>
        ) : (
          <Text size="small" tone="soft">
            {note ?? ''}
          </Text>
        )}
        {tape.length > 0 ? (
          <View
            role="group"
            aria-label={`Last: ${tape.join(', ')}`}
            style={[styles.tape, { borderTopColor: theme.rule }]}
          >
            <Text semi>{tape.slice(-5).join('  ')}</Text>
          </View>
        ) : null}
      </View>
      <View
        role="status"
        aria-live="polite"
        aria-label={value === '' ? `Nothing typed` : `${value} ${unit}`}
        style={styles.value}
      >
        {value === '' ? null : <Figure size="xl">{value}</Figure>}
        <View style={[styles.caret, { backgroundColor: theme.ink }]} />
        <Text tone="soft">{unit}</Text>
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  readout: {
    flexDirection: 'row',
    alignItems: 'flex-end',
    justifyContent: 'space-between',
    gap: space[3],
    paddingHorizontal: space[4],
    paddingVertical: 14,
  },
  left: { flexGrow: 1, flexShrink: 1, maxWidth: 220 },
  shrink: { flexShrink: 1 },
  question: { flexDirection: 'row', gap: 6 },
  tape: { marginTop: space[3], paddingTop: 5, borderTopWidth: line.row },
  value: { flexDirection: 'row', alignItems: 'flex-end', gap: space[2] },
  caret: { width: 34, height: 5, marginBottom: 6 },
});
