import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useSafeAreaInsets } from 'react-native-safe-area-context';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { useGutter } from './gutter';

/** The primary action where the thumb is. A `Screen` puts its `dock` here; use it alone inside a sheet. */
export function DockBar({ children, low = false }: { children: ReactNode; low?: boolean }) {
  const theme = useTheme();
  const wide = useIsWide();
  const gutter = useGutter();
  const insets = useSafeAreaInsets();
  const paddingBottom = wide ? space[4] : low ? Math.max(28, insets.bottom) : space[3];
  return (
    <View
      role="region"
      aria-label="Actions"
      dataSet={{ printHide: true }}
      style={[
        styles.dock,
        { backgroundColor: theme.ground, borderTopColor: theme.rule, paddingHorizontal: gutter, paddingBottom },
      ]}
    >
      <View style={wide ? styles.narrow : null}>{children}</View>
    </View>
  );
}

const styles = StyleSheet.create({
  dock: { borderTopWidth: line.row, paddingTop: space[3], zIndex: 4 },
  narrow: { maxWidth: 560, width: '100%' },
});
