import { StyleSheet, View } from 'react-native';
import { line, marginColumn, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';

type Props = {
  /** What is on its way: "Loading broods". */
  label?: string;
  rows?: number;
};

/** The ledger's rules with nothing in them yet. Still: nothing on this page loops. */
export function Loading({ label = 'Loading', rows = 5 }: Props) {
  const theme = useTheme();
  return (
    <View role="status" aria-label={label} aria-busy style={[styles.list, { borderTopColor: theme.ruleStrong }]}>
      {Array.from({ length: rows }, (_, i) => i).map((row) => (
        <View key={row} style={[styles.row, { borderBottomColor: theme.rule }]}>
          <View style={[styles.margin, { borderRightColor: theme.rule }]}>
            <View style={[styles.figure, { backgroundColor: theme.ruleSoft }]} />
          </View>
          <View style={styles.words}>
            <View style={[styles.word, { backgroundColor: theme.ruleSoft, width: `${34 + ((row * 17) % 30)}%` }]} />
            <View style={[styles.word, { backgroundColor: theme.ruleSoft, width: `${50 + ((row * 11) % 36)}%` }]} />
          </View>
        </View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  list: { borderTopWidth: line.section },
  row: { flexDirection: 'row', minHeight: 64, gap: space[3], borderBottomWidth: line.row },
  margin: {
    width: marginColumn.phone,
    alignItems: 'flex-end',
    paddingTop: 14,
    paddingRight: 10,
    borderRightWidth: line.row,
  },
  figure: { width: 24, height: 26 },
  words: { flexGrow: 1, justifyContent: 'center', gap: space[2] },
  word: { height: 12 },
});
