import type { ReactNode } from 'react';
import { ScrollView, StyleSheet } from 'react-native';
import { space } from '@/components/theme/space';
import { GutterProvider } from './gutter';

/** The scrolled column inside `WithAside`. */
export function Aside({ label, children }: { label: string; children: ReactNode }) {
  return (
    <GutterProvider value={20}>
      <ScrollView role="complementary" aria-label={label} contentContainerStyle={styles.body}>
        {children}
      </ScrollView>
    </GutterProvider>
  );
}

const styles = StyleSheet.create({ body: { paddingHorizontal: 20, paddingVertical: space[5] } });
