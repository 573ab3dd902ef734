import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { Text } from './Text';

type Props = {
  /** What can hurt, and what to do instead. */
  words: ReactNode;
  title?: string;
};

/** Where the work can hurt someone, fish or floor. Not an alarm: hollow triangle, no wash. */
export function Caution({ words, title }: Props) {
  const theme = useTheme();
  return (
    <View role="note" style={[styles.block, { borderColor: theme.rule }]}>
      <Icon name="warn" tone="trouble" label="Caution" />
      <View style={styles.words}>
        {title ? (
          <Text size="small" strong>
            {title}
          </Text>
        ) : null}
        {typeof words === 'string' ? <Text size="small">{words}</Text> : words}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  block: {
    flexDirection: 'row',
    gap: space[3],
    paddingVertical: space[3],
    borderTopWidth: line.row,
    borderBottomWidth: line.row,
    marginVertical: space[2],
  },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
});
