import { ScrollView, StyleSheet, useWindowDimensions, View } from 'react-native';
import { gutter, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { GutterProvider } from '@/components/ui/gutter';
import { useQueue } from '@/features/entries';
import { WaitingList } from './WaitingList';
import { WaitingWords } from './WaitingScreen';

/** Under the strip of a phone, opened and closed by it: what waits, above the page one is on. */
export function WaitingPanel() {
  const theme = useTheme();
  const { entries } = useQueue();
  const { height } = useWindowDimensions();
  if (entries.length === 0) return null;
  return (
    <GutterProvider value={gutter.phone}>
      <View role="region" aria-label="Records that wait here" style={{ maxHeight: height * 0.55 }}>
        <ScrollView contentContainerStyle={[styles.panel, { backgroundColor: theme.ground }]}>
          <WaitingWords />
          <WaitingList />
        </ScrollView>
      </View>
    </GutterProvider>
  );
}

const styles = StyleSheet.create({
  panel: { paddingHorizontal: gutter.phone, paddingVertical: space[3], gap: space[3] },
});
