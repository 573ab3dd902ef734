import { StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { LABELS_A_SHEET } from '@/shared/labels/layout';

/** The first sheet in small: places used up before are crossed out by a dash, those to be printed filled. */
export function SheetPicture({ skip, count }: { skip: number; count: number }) {
  const theme = useTheme();
  const printed = Math.min(count, LABELS_A_SHEET - skip);
  return (
    <View
      role="img"
      aria-label={`The first sheet: ${skip} places used up, ${printed} printed`}
      style={[styles.sheet, { borderColor: theme.control }]}
    >
      {Array.from({ length: LABELS_A_SHEET }, (_, i) => {
        const prints = i >= skip && i < skip + count;
        return (
          <View
            // biome-ignore lint/suspicious/noArrayIndexKey: places on paper are their number
            key={i}
            style={[
              styles.place,
              { borderColor: i < skip ? theme.rule : theme.control, borderStyle: i < skip ? 'dashed' : 'solid' },
              prints ? { backgroundColor: theme.ink } : null,
            ]}
          />
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  sheet: {
    width: 84,
    height: 112,
    borderWidth: line.control,
    padding: 6,
    flexDirection: 'row',
    flexWrap: 'wrap',
    gap: 4,
  },
  place: { width: 32, height: 20, borderWidth: line.control },
});
