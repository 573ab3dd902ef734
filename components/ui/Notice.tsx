import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { Text } from './Text';

/** `tell` is news, `look` deserves a look, `act` needs someone now. */
export type NoticeTone = 'tell' | 'look' | 'act';

type Props = {
  words: ReactNode;
  /** A strong first line. */
  title?: string;
  tone?: NoticeTone;
  /** Read at once: it has just appeared. */
  alert?: boolean;
  /** Buttons under the words. */
  children?: ReactNode;
};

/** A block of words that concerns all of what is below it. */
export function Notice({ words, title, tone = 'tell', alert = false, children }: Props) {
  const theme = useTheme();
  const trouble = tone !== 'tell';
  return (
    <View
      role={alert ? 'alert' : undefined}
      style={[
        styles.block,
        trouble
          ? { backgroundColor: theme.troubleWash, borderLeftColor: theme.troubleFill }
          : { backgroundColor: theme.sheet, borderLeftColor: theme.control },
      ]}
    >
      {trouble ? <Icon name={tone === 'act' ? 'warnFilled' : 'warn'} tone="trouble" /> : null}
      <View style={styles.words}>
        {title ? <Text strong>{title}</Text> : null}
        {typeof words === 'string' ? <Text size="small">{words}</Text> : words}
        {children ? <View style={styles.actions}>{children}</View> : null}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  block: {
    flexDirection: 'row',
    alignItems: 'flex-start',
    gap: space[3],
    padding: space[3],
    borderLeftWidth: 8,
    marginBottom: space[4],
  },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2], marginTop: space[3] },
});
