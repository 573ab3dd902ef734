import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, radius, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { moveFocus } from './moveFocus';
import { Press } from './Press';
import { Text } from './Text';

export type Choice<Value extends string> = { value: Value; word: string };

type Props<Value extends string> = {
  label: string;
  choices: readonly Choice<Value>[];
  value: Value | null;
  onChange: (value: Value) => void;
  /** `tabs` swaps what is shown, `radios` answers a question. */
  as?: 'radios' | 'tabs';
  invalid?: boolean;
  describedBy?: string;
};

/** Two to four words in one frame, of which one holds. */
export function Segmented<Value extends string>(props: Props<Value>) {
  const { label, choices, value, onChange, as = 'radios', invalid, describedBy } = props;
  const theme = useTheme();
  const wide = useIsWide();
  const tabs = as === 'tabs';
  const reachable = choices.some((choice) => choice.value === value) ? value : choices[0]?.value;
  return (
    <View
      role={tabs ? 'tablist' : 'radiogroup'}
      aria-label={label}
      aria-invalid={invalid}
      aria-describedby={describedBy}
      onKeyDown={(event) => moveFocus(event, tabs ? '[role=tab]' : '[role=radio]', { press: true })}
      style={[styles.frame, { borderColor: invalid ? theme.trouble : theme.control }]}
    >
      {choices.map((choice, i) => {
        const on = choice.value === value;
        return (
          <Press
            key={choice.value}
            role={tabs ? 'tab' : 'radio'}
            aria-checked={tabs ? undefined : on}
            aria-selected={tabs ? on : undefined}
            tabIndex={choice.value === reachable ? 0 : -1}
            onPress={() => onChange(choice.value)}
            style={({ pressed, hovered }) => [
              styles.cell,
              {
                minHeight: wide ? 40 : target.least,
                borderLeftColor: theme.control,
                borderLeftWidth: i === 0 ? 0 : line.row,
              },
              on ? { backgroundColor: theme.actFill } : pressed || hovered ? { backgroundColor: theme.well } : null,
            ]}
          >
            <Text size="small" strong={on} semi={!on} tone={on ? 'inverse' : 'ink'} align="center" style={styles.word}>
              {choice.word}
            </Text>
          </Press>
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  frame: { flexDirection: 'row', borderWidth: line.control, borderRadius: radius.control },
  cell: {
    flexGrow: 1,
    flexBasis: 0,
    minWidth: 0,
    alignItems: 'center',
    justifyContent: 'center',
    paddingHorizontal: 6,
    paddingVertical: 4,
  },
  word: { lineHeight: 18 },
});
