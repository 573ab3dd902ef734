import { StyleSheet, View } from 'react-native';
import { line, radius, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import type { Day } from '@/shared/days';
import type { DayChoice } from './DateField';

type Props = { label: string; choices: DayChoice[]; day: Day | null; onPick: (day: Day) => void };

/** Days that are often right, one tap each. */
export function DayChoices({ label, choices, day, onPick }: Props) {
  const theme = useTheme();
  if (choices.length === 0) return null;
  return (
    <View style={styles.choices}>
      {choices.map((choice) => {
        const on = choice.day === day;
        return (
          <Press
            key={choice.word}
            aria-label={`${label}: ${choice.word}`}
            aria-pressed={on}
            onPress={() => onPick(choice.day)}
            style={({ pressed }) => [
              styles.choice,
              { borderColor: theme.control },
              on
                ? { backgroundColor: theme.actFill, borderColor: theme.actFill }
                : pressed
                  ? { backgroundColor: theme.well }
                  : null,
            ]}
          >
            <Text size="small" semi tone={on ? 'inverse' : 'ink'}>
              {choice.word}
            </Text>
          </Press>
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  choices: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2], marginTop: space[2] },
  choice: {
    minHeight: target.least,
    justifyContent: 'center',
    paddingHorizontal: 14,
    borderWidth: line.control,
    borderRadius: radius.control,
  },
});
