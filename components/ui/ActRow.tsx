import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { type Action, Press } from './Press';
import { Text } from './Text';

type Props = Action & {
  /** The fact: "Un-ionised ammonia". */
  title: ReactNode;
  /** Value, time and limit. */
  note: ReactNode;
  /** The whole of it in words. */
  label: string;
  /** `act` = now, filled triangle; `look` = hollow. */
  level?: 'act' | 'look';
  /** It came up while the page was open. */
  fresh?: boolean;
};

/** Trouble that leads somewhere: first on Today, top of the right column on a wide screen. */
export function ActRow({ title, note, label, level = 'act', fresh = false, href, onPress }: Props) {
  const theme = useTheme();
  return (
    <View role={fresh ? 'alert' : undefined}>
      <Press
        href={href}
        onPress={onPress}
        aria-label={label}
        style={({ pressed, hovered }) => [
          styles.row,
          {
            backgroundColor: theme.troubleWash,
            borderLeftColor: theme.troubleFill,
            opacity: pressed || hovered ? 0.9 : 1,
          },
        ]}
      >
        <Icon name={level === 'act' ? 'warnFilled' : 'warn'} tone="trouble" />
        <View style={styles.words}>
          {typeof title === 'string' ? <Text strong>{title}</Text> : title}
          {typeof note === 'string' ? <Text size="small">{note}</Text> : note}
        </View>
        <Icon name="next" />
      </Press>
    </View>
  );
}

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    minHeight: 72,
    padding: space[3],
    borderLeftWidth: 8,
  },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
});
