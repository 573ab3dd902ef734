import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from './Text';

export type KeyValue = {
  key: string;
  value: ReactNode /** Where it comes from, smaller, under the value. */;
  note?: string;
};

type Props = {
  pairs: readonly KeyValue[];
  /** Values at the right edge: prices, readings. */
  right?: boolean;
  /** Width of the column of keys. */
  keyWidth?: number;
};

/** Ruled pairs of what and how much. */
export function KeyValues({ pairs, right = false, keyWidth = 130 }: Props) {
  const theme = useTheme();
  return (
    <View role="list">
      {pairs.map(({ key, value, note }) => (
        <View key={key} role="listitem" style={[styles.pair, { borderBottomColor: theme.rule }]}>
          <Text size="small" tone="soft" style={{ minWidth: right ? undefined : keyWidth, flexShrink: 1 }}>
            {key}
          </Text>
          <View style={right ? styles.right : styles.value}>
            {typeof value === 'string' ? (
              <Text size="small" strong align={right ? 'right' : 'left'}>
                {value}
              </Text>
            ) : (
              value
            )}
            {note ? (
              <Text size="label" tone="soft" align={right ? 'right' : 'left'}>
                {note}
              </Text>
            ) : null}
          </View>
        </View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  pair: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    columnGap: space[3],
    paddingVertical: 9,
    borderBottomWidth: line.row,
    alignItems: 'baseline',
  },
  value: { flexGrow: 1, flexShrink: 1, flexBasis: 140, minWidth: 0 },
  right: { flexGrow: 1, flexShrink: 1, alignItems: 'flex-end' },
});
