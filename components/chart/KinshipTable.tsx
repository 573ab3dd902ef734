import { useVirtualizer } from '@tanstack/react-virtual';
import { memo, useCallback, useMemo, useRef } from 'react';
import { StyleSheet, useWindowDimensions, View, type WebKeyEvent } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { elementOf } from '@/components/ui/elementOf';
import type { Sex } from '@/components/ui/SexShape';
import { KinshipCell, type KinshipValue } from './KinshipCell';
import { KinshipColumnHeads, KinshipRowHead, type ShownColumn } from './KinshipHeads';
import { type KinshipSizes, kinshipSizes } from './kinshipSizes';
import { cellAt, cellBeside } from './kinshipSteps';

/** A fish at the head of a row or column. */
export type KinFish = {
  id: string;
  code: string;
  /** Its code without what all of them share. */
  short: string;
  sex: Sex;
  /** Its sex is proposed only. */
  possible?: boolean;
  /** Under the code at the head of a row: its mean kinship. */
  note?: string;
};

export type KinshipTableProps = {
  label: string;
  /** Males, or in the square matrix everyone; the most useful first. */
  across: readonly KinFish[];
  down: readonly KinFish[];
  /** Has to stay the same function while the figures stay the same. */
  valueFor: (down: KinFish, across: KinFish) => KinshipValue;
  /** At or over it the bar is red. */
  limit: number;
  picked: { down: string; across: string } | null;
  onPick: (down: KinFish, across: KinFish) => void;
};

/** The kinship of each with each, which is the F that their young would have. Draws only the cells that are seen. */
export function KinshipTable(props: KinshipTableProps) {
  const { label, across, down, valueFor, limit, picked, onPick } = props;
  const theme = useTheme();
  const box = useRef<View>(null);
  const window = useWindowDimensions();
  const sizes = useMemo(() => kinshipSizes(across, down), [across, down]);
  const scroller = () => elementOf(box.current);
  const rows = useVirtualizer({
    count: down.length,
    getScrollElement: scroller,
    estimateSize: () => sizes.row,
    overscan: 1,
    scrollPaddingStart: sizes.columnHead,
  });
  const columns = useVirtualizer({
    horizontal: true,
    count: across.length,
    getScrollElement: scroller,
    estimateSize: () => sizes.column,
    overscan: 1,
    scrollPaddingStart: sizes.rowHead,
  });
  const seen = columns.getVirtualItems();
  const [first, last] = [seen[0]?.index ?? 0, seen.at(-1)?.index ?? -1];
  const shown = useMemo(
    () =>
      across
        .slice(first, last + 1)
        .map((fish, i): ShownColumn => ({ fish, left: sizes.rowHead + (first + i) * sizes.column, index: first + i })),
    [across, first, last, sizes],
  );
  const width = sizes.rowHead + across.length * sizes.column;
  const height = sizes.columnHead + down.length * sizes.row;
  const pick = useCallback(
    (row: number, column: number) => {
      const [one, other] = [down[row], across[column]];
      if (one && other) onPick(one, other);
    },
    [down, across, onPick],
  );
  const onKeyDown = (event: WebKeyEvent) => {
    const at = cellAt(event.target);
    if (!at) return;
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      return pick(at.row, at.column);
    }
    const to = cellBeside(at, event.key, { rows: down.length, columns: across.length });
    if (!to) return;
    event.preventDefault();
    rows.scrollToIndex(to.row);
    columns.scrollToIndex(to.column);
    // The cell is drawn once the table has come to it.
    setTimeout(() => scroller()?.querySelector<HTMLElement>(`[data-cell="${to.row} ${to.column}"]`)?.focus(), 60);
  };
  const press = {
    onClick: (event: { target: unknown }) => {
      const at = cellAt(event.target);
      if (at) pick(at.row, at.column);
    },
  };
  const firstRow = rows.getVirtualItems()[0]?.index ?? 0;
  return (
    <View
      ref={box}
      role="grid"
      aria-label={label}
      aria-rowcount={down.length + 1}
      aria-colcount={across.length + 1}
      onKeyDown={onKeyDown}
      {...press}
      style={[
        styles.box,
        { borderTopColor: theme.ruleStrong, height: height + 4, maxHeight: Math.max(360, window.height * 0.7) },
      ]}
    >
      <View role="rowgroup" style={{ width, height }}>
        <KinshipColumnHeads columns={shown} sizes={sizes} width={width} />
        {rows.getVirtualItems().map(({ index }) => {
          const fish = down[index];
          return fish ? (
            <KinshipRow
              // By place: another search changes what a row says, it does not make the row anew.
              key={index}
              fish={fish}
              index={index}
              sizes={sizes}
              width={width}
              columns={shown}
              valueFor={valueFor}
              limit={limit}
              pickedColumn={picked?.down === fish.id ? picked.across : null}
              reachable={index === firstRow ? first : -1}
            />
          ) : null;
        })}
      </View>
    </View>
  );
}

type RowProps = Pick<KinshipTableProps, 'valueFor' | 'limit'> & {
  fish: KinFish;
  index: number;
  sizes: KinshipSizes;
  width: number;
  columns: readonly ShownColumn[];
  pickedColumn: string | null;
  /** The column of the one cell that the Tab key comes to; arrow keys go on from there. */
  reachable: number;
};

const KinshipRow = memo(function KinshipRow(row: RowProps) {
  const { fish, index, sizes, width, columns, valueFor, limit, pickedColumn, reachable } = row;
  const theme = useTheme();
  const top = sizes.columnHead + index * sizes.row;
  return (
    <View
      role="row"
      aria-rowindex={index + 2}
      style={[styles.row, { top, width, height: sizes.row, borderBottomColor: theme.rule }]}
    >
      <KinshipRowHead fish={fish} sizes={sizes} />
      {columns.map((column) => (
        <KinshipCell
          key={column.index}
          down={fish}
          across={column.fish}
          value={valueFor(fish, column.fish)}
          limit={limit}
          theme={theme}
          picked={pickedColumn === column.fish.id}
          reachable={reachable === column.index}
          row={index}
          column={column.index}
          left={column.left}
          sizes={sizes}
        />
      ))}
    </View>
  );
});

const styles = StyleSheet.create({
  box: { overflow: 'scroll', borderTopWidth: line.section },
  row: { position: 'absolute', left: 0, flexDirection: 'row', borderBottomWidth: line.row },
});
