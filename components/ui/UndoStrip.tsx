import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from './Button';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import type { IconName } from './iconMarks';
import { Text } from './Text';

type Props = {
  /** "Loss, 1 in T12. Saved." */
  words: string;
  icon?: IconName;
  /** Names the record: "Undo Loss, 1". */
  undoLabel: string;
  onUndo: () => void;
  onDismiss: () => void;
  busy?: boolean;
};

/** Confirms a record and takes it back, right above the bottom bar where the thumb is. */
export function UndoStrip({ words, icon, undoLabel, onUndo, onDismiss, busy }: Props) {
  const theme = useTheme();
  return (
    <View
      dataSet={{ rise: true, printHide: true }}
      style={[styles.strip, { backgroundColor: theme.sheet, borderTopColor: theme.control }]}
    >
      {icon ? <Icon name={icon} /> : null}
      <Text role="status" aria-live="polite" size="small" strong style={styles.words}>
        {words}
      </Text>
      <Button label="Undo" describe={undoLabel} icon="undo" small onPress={onUndo} busy={busy} busyLabel="Undoing" />
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
    // Clear of the Record cell, which stands 12 px into it.
    paddingBottom: space[2] + 12,
    borderTopWidth: line.row,
  },
  words: { flexGrow: 1, flexShrink: 1 },
});
