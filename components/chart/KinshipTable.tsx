import { useVirtualizer } from '@tanstack/react-virtual';
import { useRef } from 'react';
import { StyleSheet, useWindowDimensions, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { elementOf } from '@/components/ui/elementOf';
import type { Sex } from '@/components/ui/SexShape';
import { KinshipCell, type KinshipValue } from './KinshipCell';
import { KinshipColumnHeads, KinshipRowHead, type ShownColumn } from './KinshipHeads';
import { kinshipSizes } from './kinshipSizes';

/** A fish at the head of a row or column. `possible`: its sex is proposed only. */
export type KinFish = { id: string; code: string; sex: Sex; possible?: boolean };

export type KinshipTableProps = {
  label: string;
  /** Males, or in the square matrix everyone; the most useful first. */
  across: readonly KinFish[];
  down: readonly KinFish[];
  /** F of their young; null for a fish with itself. */
  valueFor: (down: KinFish, across: KinFish) => KinshipValue | null;
  /** At or over it the bar is red. */
  limit: number;
  picked: { down: string; across: string } | null;
  onPick: (down: KinFish, across: KinFish) => void;
  /** Small cells of the square matrix. */
  small?: boolean;
};

/** Males across, females down: the F that their young would have. Draws only the cells that are seen. */
export function KinshipTable(props: KinshipTableProps) {
  const { label, across, down, small = false } = props;
  const theme = useTheme();
  const box = useRef<View>(null);
  const window = useWindowDimensions();
  const sizes = kinshipSizes(across, down, small);
  const scroller = () => elementOf(box.current);
  const rows = useVirtualizer({
    count: down.length,
    getScrollElement: scroller,
    estimateSize: () => sizes.row,
    overscan: 6,
  });
  const columns = useVirtualizer({
    horizontal: true,
    count: across.length,
    getScrollElement: scroller,
    estimateSize: () => sizes.column,
    overscan: 4,
  });
  const shown = columns.getVirtualItems().flatMap(({ index, start }): ShownColumn[] => {
    const fish = across[index];
    return fish ? [{ fish, left: sizes.rowHead + start, index }] : [];
  });
  const width = sizes.rowHead + across.length * sizes.column;
  const height = sizes.columnHead + down.length * sizes.row;
  return (
    <View
      ref={box}
      role="table"
      aria-label={label}
      aria-rowcount={down.length + 1}
      aria-colcount={across.length + 1}
      tabIndex={0}
      style={[
        styles.box,
        { borderTopColor: theme.ruleStrong, height: height + 4, maxHeight: Math.max(360, window.height * 0.7) },
      ]}
    >
      <View style={{ width, height }}>
        <KinshipColumnHeads columns={shown} sizes={sizes} width={width} />
        {rows.getVirtualItems().map(({ index, start }) => {
          const fish = down[index];
          return fish ? (
            <KinshipRow
              key={fish.id}
              {...props}
              fish={fish}
              index={index}
              top={sizes.columnHead + start}
              width={width}
              columns={shown}
            />
          ) : null;
        })}
      </View>
    </View>
  );
}

type RowProps = KinshipTableProps & {
  fish: KinFish;
  index: number;
  top: number;
  width: number;
  columns: readonly ShownColumn[];
};

function KinshipRow({ fish, index, top, width, columns, ...table }: RowProps) {
  const theme = useTheme();
  const { across, down, valueFor, limit, picked, onPick, small = false } = table;
  const sizes = kinshipSizes(across, down, small);
  return (
    <View
      role="row"
      aria-rowindex={index + 2}
      style={[styles.row, { top, width, height: sizes.row, borderBottomColor: theme.rule }]}
    >
      <KinshipRowHead fish={fish} sizes={sizes} />
      {columns.map((column) => (
        <KinshipCell
          key={column.fish.id}
          down={fish}
          across={column.fish}
          value={valueFor(fish, column.fish)}
          limit={limit}
          picked={picked?.down === fish.id && picked.across === column.fish.id}
          onPick={onPick}
          small={small}
          column={column.index + 2}
          place={{ left: column.left, width: sizes.column, height: sizes.row - 1 }}
        />
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  box: { overflow: 'scroll', borderTopWidth: line.section },
  row: { position: 'absolute', left: 0, flexDirection: 'row', borderBottomWidth: line.row },
});
