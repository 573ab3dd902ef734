import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { PaneContext } from './paneContext';

type Props = {
  /** A `Screen` of rows. */
  list: ReactNode;
  /** The `Screen` of what is chosen; null shows the list alone on a phone and `nothing` beside it on a wide screen. */
  detail: ReactNode | null;
  nothing?: ReactNode;
  listWidth?: number;
};

/** List and detail side by side from 1080 px; below, the detail or else the list. */
export function TwoPane({ list, detail, nothing, listWidth = 372 }: Props) {
  const theme = useTheme();
  const full = useBreakpoint() === 'full';
  if (!full) return detail ?? list;
  return (
    <View role="main" style={styles.panes}>
      <View style={{ width: listWidth, borderRightWidth: line.row, borderRightColor: theme.rule }}>
        <PaneContext value="list">{list}</PaneContext>
      </View>
      <View style={styles.fill}>
        <PaneContext value="detail">{detail ?? <View style={styles.nothing}>{nothing}</View>}</PaneContext>
      </View>
    </View>
  );
}

/** A page with a column of its own on the right; below 1080 px the column's contents follow, or `above` puts them first. */
export function WithAside({ children, aside, width = 316 }: { children: ReactNode; aside: ReactNode; width?: number }) {
  const theme = useTheme();
  const full = useBreakpoint() === 'full';
  if (!full) return children;
  return (
    <View role="main" style={styles.panes}>
      <View style={styles.fill}>
        <PaneContext value="detail">{children}</PaneContext>
      </View>
      <View style={{ width, borderLeftWidth: line.row, borderLeftColor: theme.rule }}>
        <PaneContext value="aside">{aside}</PaneContext>
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  panes: { flexGrow: 1, flexShrink: 1, flexBasis: 0, flexDirection: 'row', minHeight: 0 },
  nothing: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0, padding: space[6] },
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
});
