import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, radius, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Press } from './Press';
import { Text } from './Text';

/** Search, order and filters of a list, in one or two lines. */
export function Toolbar({ children }: { children: ReactNode }) {
  return <View style={styles.bar}>{children}</View>;
}

type FilterProps<Value extends string> = {
  label: string;
  filters: readonly { value: Value; word: string; count?: number }[];
  on: readonly Value[];
  onChange: (on: Value[]) => void;
};

/** Filters that can be on together; each says how many it leaves. */
export function Filters<Value extends string>({ label, filters, on, onChange }: FilterProps<Value>) {
  const theme = useTheme();
  return (
    <View role="group" aria-label={label} style={styles.filters}>
      {filters.map(({ value, word, count }) => {
        const chosen = on.includes(value);
        return (
          <Press
            key={value}
            aria-pressed={chosen}
            onPress={() => onChange(chosen ? on.filter((other) => other !== value) : [...on, value])}
            style={({ pressed }) => [
              styles.filter,
              { borderColor: theme.control },
              chosen
                ? { backgroundColor: theme.actFill, borderColor: theme.actFill }
                : pressed
                  ? { backgroundColor: theme.well }
                  : null,
            ]}
          >
            <Text size="small" semi tone={chosen ? 'inverse' : 'ink'}>
              {count === undefined ? word : `${word} ${count}`}
            </Text>
          </Press>
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  bar: { gap: space[2], paddingVertical: space[3] },
  filters: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2] },
  filter: {
    minHeight: target.least,
    justifyContent: 'center',
    paddingHorizontal: space[3],
    borderWidth: line.control,
    borderRadius: radius.control,
  },
});
