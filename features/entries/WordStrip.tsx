import { StyleSheet, View } from 'react-native';
import { bar, line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Icon } from '@/components/ui/Icon';
import { IconButton } from '@/components/ui/IconButton';
import type { IconName } from '@/components/ui/iconMarks';
import { Text } from '@/components/ui/Text';

type Props = {
  words: string;
  icon: IconName;
  action?: { label: string; describe: string; onPress: () => void };
  onDismiss: () => void;
};

/** The strip over the bottom of a page where there is nothing to undo: it was undone, it could not be, a draft was kept. */
export function WordStrip({ words, icon, action, onDismiss }: Props) {
  const theme = useTheme();
  return (
    <View
      dataSet={{ rise: true, printHide: true }}
      style={[styles.strip, { backgroundColor: theme.sheet, borderTopColor: theme.control }]}
    >
      <Icon name={icon} tone={icon === 'warn' ? 'trouble' : 'ink'} />
      <Text role="status" aria-live="polite" size="small" strong style={styles.words}>
        {words}
      </Text>
      {action ? <Button label={action.label} describe={action.describe} small onPress={action.onPress} /> : null}
      <IconButton icon="close" label="Hide this" onPress={onDismiss} />
    </View>
  );
}

const styles = StyleSheet.create({
  strip: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    paddingLeft: space[4],
    paddingRight: space[1],
    paddingTop: space[2],
    // Clear of the Record cell, which stands into it.
    paddingBottom: space[2] + bar.rise,
    borderTopWidth: line.row,
  },
  words: { flexGrow: 1, flexShrink: 1 },
});
