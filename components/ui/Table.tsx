import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from './Text';

export type Column = {
  key: string;
  word: string;
  /** Numbers stand at the right. */
  right?: boolean;
  /** Share of the width; 1 unless said. */
  grow?: number;
  /** Fixed width in px instead of a share. */
  width?: number;
};

export type TableRow = { key: string; cells: Record<string, ReactNode> };

type Props = {
  label: string;
  columns: readonly Column[];
  rows: readonly TableRow[];
  /** Rows of 33 px, on wide screens. */
  tight?: boolean;
  /** When there are no rows. */
  empty?: string;
};

/** A small table: her earlier holds, the samples behind a chart. Long ones are `VirtualList`s of rows. */
export function Table({ label, columns, rows, tight = false, empty = 'None yet' }: Props) {
  const theme = useTheme();
  const edge = { borderBottomColor: theme.rule };
  return (
    <View role="table" aria-label={label} aria-rowcount={rows.length + 1}>
      <View role="row" style={[styles.row, edge]}>
        {columns.map((column) => (
          <View key={column.key} role="columnheader" style={place(column)}>
            <Text size="label" semi tone="soft" align={column.right ? 'right' : 'left'}>
              {column.word}
            </Text>
          </View>
        ))}
      </View>
      {rows.map((row) => (
        <View key={row.key} role="row" style={[styles.row, tight ? styles.tight : styles.tall, edge]}>
          {columns.map((column) => (
            <View key={column.key} role="cell" style={[place(column), column.right ? styles.right : null]}>
              {cellOf(row.cells[column.key], column.right === true)}
            </View>
          ))}
        </View>
      ))}
      {rows.length === 0 ? (
        <Text size="small" tone="soft" style={styles.empty}>
          {empty}
        </Text>
      ) : null}
    </View>
  );
}

const place = ({ grow = 1, width }: Column) =>
  width === undefined ? { flexGrow: grow, flexShrink: 1, flexBasis: 0, minWidth: 0 } : { width, flexShrink: 0 };

const cellOf = (cell: ReactNode, right: boolean) =>
  typeof cell === 'string' || typeof cell === 'number' ? (
    <Text size="small" align={right ? 'right' : 'left'}>
      {String(cell)}
    </Text>
  ) : (
    cell
  );

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    paddingVertical: space[2],
    borderBottomWidth: line.row,
  },
  tall: { minHeight: 40 },
  tight: { minHeight: 33, paddingVertical: 6 },
  right: { alignItems: 'flex-end' },
  empty: { paddingVertical: space[3] },
});
