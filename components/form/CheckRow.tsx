import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import { CheckBox } from './CheckBox';
import { FieldError } from './FieldFrame';
import { useFieldState } from './useFieldState';

type RowProps = {
  on: boolean;
  onChange: (on: boolean) => void;
  /** Said by a screen reader: the code, or the whole statement. */
  label: string;
  /** Drawn instead of the label: shape and code. */
  children?: ReactNode;
  /** At the right: "Dominant 6 of 7 days". */
  note?: ReactNode;
  /** Why it cannot be changed. */
  disabledBecause?: string | null;
  invalid?: boolean;
};

/** A row that is ticked or not. The whole row is the target. */
export function CheckRow({ on, onChange, label, children, note, disabledBecause, invalid }: RowProps) {
  const theme = useTheme();
  const off = Boolean(disabledBecause);
  const side = disabledBecause ?? note;
  return (
    <Press
      role="checkbox"
      aria-checked={on}
      aria-invalid={invalid || undefined}
      aria-label={typeof side === 'string' ? `${label}, ${side}` : label}
      unavailable={off}
      onPress={() => onChange(!on)}
      style={({ pressed }) => [
        styles.row,
        { borderBottomColor: theme.rule, backgroundColor: pressed ? theme.well : 'transparent' },
      ]}
    >
      <CheckBox on={on} off={off} />
      <View style={styles.words}>{children ?? <Text tone={off ? 'faint' : 'ink'}>{label}</Text>}</View>
      {typeof side === 'string' ? (
        <Text size="small" tone="soft" align="right" style={styles.note}>
          {side}
        </Text>
      ) : (
        side
      )}
    </Press>
  );
}

/** A yes or no of the draft. */
export function CheckField({ name, ...row }: Omit<RowProps, 'on' | 'onChange' | 'invalid'> & { name: string }) {
  const field = useFieldState(name);
  return (
    <View>
      <CheckRow {...row} on={field.value === true} onChange={field.change} invalid={field.error !== null} />
      <FieldError id={field.errorId} words={field.error} />
    </View>
  );
}

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    columnGap: space[2] + 2,
    minHeight: 52,
    paddingVertical: space[2],
    borderBottomWidth: line.row,
  },
  words: { flexDirection: 'row', alignItems: 'center', gap: space[2], flexGrow: 1, flexShrink: 1 },
  note: { flexShrink: 1, marginLeft: 'auto' },
});
