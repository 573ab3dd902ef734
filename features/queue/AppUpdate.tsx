import { useEffect, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { IconButton } from '@/components/ui/IconButton';
import { Text } from '@/components/ui/Text';
import { watchForUpdate } from './serviceWorker';

/** The app's files are kept on the device; a new version waits until the keeper takes it, so that no page breaks under them. */
export function AppUpdate() {
  const theme = useTheme();
  const [take, setTake] = useState<(() => void) | null>(null);
  useEffect(() => watchForUpdate((ready) => setTake(() => ready)), []);
  if (!take) return null;
  return (
    <View
      role="region"
      aria-label="New version"
      dataSet={{ printHide: true }}
      style={[styles.strip, { backgroundColor: theme.sheet, borderBottomColor: theme.control }]}
    >
      <Text role="status" size="small" strong style={styles.words}>
        A new version of Kinwater is ready. Drafts and waiting records stay.
      </Text>
      <Button label="Use it" small onPress={take} />
      <IconButton icon="close" label="Later" onPress={() => setTake(null)} />
    </View>
  );
}

const styles = StyleSheet.create({
  strip: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    paddingLeft: space[4],
    paddingVertical: space[1],
    borderBottomWidth: line.row,
  },
  words: { flexGrow: 1, flexShrink: 1 },
});
