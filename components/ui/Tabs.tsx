import type { Href } from 'expo-router';
import { useEffect, useRef } from 'react';
import { ScrollView, StyleSheet, View } from 'react-native';
import { line, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { elementOf } from './elementOf';
import { moveFocus } from './moveFocus';
import { Press } from './Press';
import { Text } from './Text';

export type Tab<Value extends string> = { value: Value; word: string; count?: number; href?: Href };

type Props<Value extends string> = {
  label: string;
  tabs: readonly Tab<Value>[];
  value: Value;
  /** Left out when every tab is a page of its own. */
  onChange?: (value: Value) => void;
};

/** Parts of one page, or pages of one place: words with a thick bar under the one that is shown. */
export function Tabs<Value extends string>({ label, tabs, value, onChange }: Props<Value>) {
  const theme = useTheme();
  const frame = useRef<View>(null);
  // On a phone the last tabs lie beyond the edge: the chosen one is brought in.
  useEffect(() => {
    const chosen = elementOf(frame.current)?.querySelector(`[data-tab="${value}"]`);
    chosen?.scrollIntoView({ inline: 'nearest', block: 'nearest' });
  }, [value]);
  const pages = tabs.every((tab) => tab.href !== undefined);
  return (
    <View
      ref={frame}
      role={pages ? 'navigation' : 'tablist'}
      aria-label={label}
      onKeyDown={pages ? undefined : (event) => moveFocus(event, '[role=tab]', { press: true })}
      style={[styles.frame, { borderBottomColor: theme.rule }]}
    >
      <ScrollView horizontal showsHorizontalScrollIndicator={false} contentContainerStyle={styles.tabs}>
        {tabs.map((tab) => {
          const on = tab.value === value;
          return (
            <Press
              key={tab.value}
              dataSet={{ tab: tab.value }}
              href={tab.href}
              onPress={() => onChange?.(tab.value)}
              role={pages ? undefined : 'tab'}
              aria-selected={pages ? undefined : on}
              aria-current={pages && on ? 'page' : undefined}
              tabIndex={pages || on ? 0 : -1}
              style={[styles.tab, { borderBottomColor: on ? theme.ink : 'transparent' }]}
            >
              <Text strong={on} semi={!on} tone={on ? 'ink' : 'soft'} whole>
                {tab.count === undefined ? tab.word : `${tab.word} ${tab.count}`}
              </Text>
            </Press>
          );
        })}
      </ScrollView>
    </View>
  );
}

const styles = StyleSheet.create({
  frame: { borderBottomWidth: line.row },
  tabs: { gap: space[5] },
  tab: {
    minHeight: target.least,
    minWidth: 44,
    justifyContent: 'center',
    borderBottomWidth: line.place,
    borderTopWidth: line.place,
    borderTopColor: 'transparent',
  },
});
