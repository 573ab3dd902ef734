import { StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { KinFish } from './KinshipTable';
import type { KinshipSizes } from './kinshipSizes';

export type ShownColumn = { fish: KinFish; left: number; index: number };

type HeadsProps = { columns: readonly ShownColumn[]; sizes: KinshipSizes; width: number };

/** Stays on top while the rows scroll under it. */
export function KinshipColumnHeads({ columns, sizes, width }: HeadsProps) {
  const theme = useTheme();
  const height = sizes.columnHead - 1;
  return (
    <View
      role="row"
      dataSet={{ stick: 'top' }}
      style={[
        styles.heads,
        { height: sizes.columnHead, width, backgroundColor: theme.ground, borderBottomColor: theme.rule },
      ]}
    >
      <View
        role="columnheader"
        dataSet={{ stick: 'left' }}
        style={[styles.corner, { width: sizes.rowHead, height, backgroundColor: theme.ground }]}
      >
        <Text size="label" tone="faint">
          Fish
        </Text>
      </View>
      {columns.map(({ fish, left, index }) => (
        <View
          key={fish.id}
          role="columnheader"
          aria-colindex={index + 2}
          aria-label={fish.code}
          style={[styles.column, { left, width: sizes.column, height, borderLeftColor: theme.rule }]}
        >
          <FishHead fish={fish} stacked={sizes.stacked} />
        </View>
      ))}
    </View>
  );
}

/** Stays at the left while the columns scroll under it. */
export function KinshipRowHead({ fish, sizes }: { fish: KinFish; sizes: KinshipSizes }) {
  const theme = useTheme();
  return (
    <View
      role="rowheader"
      aria-label={fish.note ? `${fish.code}, ${fish.note}` : fish.code}
      dataSet={{ stick: 'left' }}
      style={[styles.row, { width: sizes.rowHead, height: sizes.row - 1, backgroundColor: theme.ground }]}
    >
      <FishHead fish={fish} stacked={false} />
      {fish.note ? (
        <Text size="label" tone="soft" whole>
          {fish.note}
        </Text>
      ) : null}
    </View>
  );
}

function FishHead({ fish, stacked }: { fish: KinFish; stacked: boolean }) {
  return (
    <View style={stacked ? styles.stacked : styles.beside}>
      <SexShape sex={fish.sex} possible={fish.possible} size={13} />
      <Code size="label" cut style={styles.code}>
        {fish.short}
      </Code>
    </View>
  );
}

const styles = StyleSheet.create({
  heads: { flexDirection: 'row', borderBottomWidth: line.row, zIndex: 2 },
  corner: { zIndex: 3, justifyContent: 'flex-end', paddingBottom: 6 },
  column: { position: 'absolute', top: 0, justifyContent: 'center', paddingHorizontal: 5, borderLeftWidth: line.row },
  row: { justifyContent: 'center', zIndex: 1, paddingRight: 4 },
  beside: { flexDirection: 'row', alignItems: 'center', gap: 5 },
  stacked: { alignItems: 'center', gap: 3 },
  code: { flexShrink: 1 },
});
