import type { Href } from 'expo-router';
import { StyleSheet } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, radius, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { Kbd } from './Kbd';
import { Press } from './Press';
import { Text } from './Text';

/** Looks like the field of the page that it leads to. */
export function SearchLink({ href, words }: { href: Href; words: string }) {
  const theme = useTheme();
  const wide = useIsWide();
  return (
    <Press
      href={href}
      aria-label={`Search: ${words}`}
      style={({ pressed, hovered }) => [
        styles.box,
        {
          minHeight: wide ? target.wide : target.primary,
          minWidth: wide ? 280 : 0,
          borderColor: theme.control,
          backgroundColor: pressed || hovered ? theme.well : 'transparent',
        },
      ]}
    >
      <Icon name="search" tone="soft" />
      <Text tone="soft" cut style={styles.words}>
        {words}
      </Text>
      {wide ? <Kbd letter="/" /> : null}
    </Press>
  );
}

const styles = StyleSheet.create({
  box: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[2],
    paddingHorizontal: space[3],
    borderWidth: line.control,
    borderRadius: radius.control,
  },
  words: { flexGrow: 1, flexShrink: 1 },
});
