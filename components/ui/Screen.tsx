import { type ReactNode, useEffect, useRef } from 'react';
import { ScrollView, StyleSheet, View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { bar, gutter, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { usePageTitle } from '@/hooks/usePageTitle';
import { DockBar } from './DockBar';
import { focusLostHeading } from './focusHeading';
import { GutterProvider } from './gutter';
import { type PanePlace, ScrollContext, usePane } from './paneContext';
import { ScreenHead, type ScreenHeadProps } from './ScreenHead';

export type ScreenProps = ScreenHeadProps & {
  children: ReactNode;
  /** The primary action, fixed in the bottom third. */
  dock?: ReactNode;
  /** Stays above the scrolled part: tabs, a search field. */
  fixed?: ReactNode;
  /** No bottom bar under it, as in a form that fills the phone. */
  low?: boolean;
  /** Lines of text stay short on a wide screen: forms and settings. */
  measure?: boolean;
};

const paneGutter: Record<PanePlace, number> = { alone: gutter.wide, list: 20, detail: gutter.wide, aside: 20 };

/** One page: head, what scrolls, dock. Beside another it becomes a pane without landmarks of its own. */
export function Screen({ children, dock, fixed, low = false, measure = false, ...head }: ScreenProps) {
  const theme = useTheme();
  const pane = usePane();
  const phone = useBreakpoint() === 'phone';
  const scroll = useRef<ScrollView>(null);
  const root = useRef<View>(null);
  usePageTitle(head.title);
  useEffect(() => focusLostHeading(root.current), []);
  const side = phone ? gutter.phone : paneGutter[pane];
  return (
    <GutterProvider value={side}>
      <View
        ref={root}
        role={pane === 'alone' ? undefined : 'region'}
        aria-label={pane === 'alone' ? undefined : head.title}
        style={[styles.fill, { backgroundColor: theme.ground }]}
      >
        <ScreenHead {...head} />
        <View role={pane === 'alone' ? 'main' : undefined} style={styles.fill}>
          {fixed ? <View style={{ paddingHorizontal: side }}>{fixed}</View> : null}
          <ScrollContext value={scroll}>
            <ScrollView
              ref={scroll}
              dataSet={{ flow: true }}
              style={styles.fill}
              contentContainerStyle={[
                styles.body,
                { paddingHorizontal: side },
                measure && !phone ? styles.measure : null,
              ]}
            >
              {children}
            </ScrollView>
          </ScrollContext>
          {dock ? <DockBar low={low}>{dock}</DockBar> : null}
        </View>
      </View>
    </GutterProvider>
  );
}

const styles = StyleSheet.create({
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0, minWidth: 0 },
  // The Record cell stands over the end of what scrolls.
  body: { paddingBottom: space[5] + bar.rise },
  measure: { maxWidth: 720 },
});
