import { ScrollView, StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Stage } from '@/components/theme/theme';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import { type Day, formatDate, formatShortDay } from '@/shared/days';

export type DateBar = {
  id: string;
  day: Day;
  /** Height of the bar: the length on that day, in any one unit; null where it is not known. */
  value: number | null;
  stage: Stage;
};

type Props = {
  label: string;
  bars: readonly DateBar[];
  a: string | null;
  b: string | null;
  /** The slot that the next press fills is the caller's to decide. */
  onPick: (id: string) => void;
};

const HEIGHT = 84;
const WIDTH = 48;

/** Photos by date: a press chooses what is compared. A and B stand over their bars. */
export function DateBars({ label, bars, a, b, onPick }: Props) {
  const theme = useTheme();
  const most = Math.max(1e-9, ...bars.map((bar) => bar.value ?? 0));
  return (
    <ScrollView horizontal style={[styles.frame, { borderTopColor: theme.ruleStrong }]}>
      <View role="group" aria-label={label} style={styles.bars}>
        {bars.map((bar) => {
          const slot = bar.id === a ? 'A' : bar.id === b ? 'B' : null;
          const [date = '', month = ''] = formatShortDay(bar.day).split(' ');
          return (
            <Press
              key={bar.id}
              aria-pressed={slot !== null}
              aria-label={slot ? `${formatDate(bar.day)}, shown as ${slot}` : formatDate(bar.day)}
              onPress={() => onPick(bar.id)}
              style={({ pressed }) => [
                styles.cell,
                { borderRightColor: theme.rule, backgroundColor: pressed ? theme.well : 'transparent' },
              ]}
            >
              <View style={styles.field}>
                {slot ? (
                  <View style={[styles.slot, { backgroundColor: theme.actFill }]}>
                    <Text size="small" strong tone="inverse">
                      {slot}
                    </Text>
                  </View>
                ) : null}
                <View
                  style={[
                    styles.bar,
                    bar.value === null
                      ? { height: 12, borderWidth: line.control, borderStyle: 'dashed', borderColor: theme.control }
                      : { height: (bar.value / most) * (HEIGHT - 24), backgroundColor: theme.stage[bar.stage] },
                  ]}
                />
              </View>
              {[date, month].map((word) => (
                <Text key={word} size="label" strong={slot !== null} tone={slot ? 'ink' : 'soft'}>
                  {word}
                </Text>
              ))}
            </Press>
          );
        })}
      </View>
    </ScrollView>
  );
}

const styles = StyleSheet.create({
  frame: { borderTopWidth: line.section, flexGrow: 0 },
  bars: { flexDirection: 'row' },
  cell: { width: WIDTH, alignItems: 'center', paddingBottom: space[2], borderRightWidth: line.row },
  field: { height: HEIGHT, justifyContent: 'flex-end', alignItems: 'center', marginBottom: 4 },
  slot: { width: 22, height: 22, alignItems: 'center', justifyContent: 'center', marginBottom: 4 },
  bar: { width: 12 },
});
