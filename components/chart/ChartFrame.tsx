import { type ReactNode, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Heading } from '@/components/ui/Heading';
import { type Column, Table, type TableRow } from '@/components/ui/Table';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useWidth } from '@/hooks/useWidth';

export type ChartTable = { columns: readonly Column[]; rows: readonly TableRow[] };

type Props = {
  /** The answer: "Half at 5 cm by 2 Jun". Left out under a section's own head. */
  title?: string;
  /** Range, number of samples, measure, unit. */
  note?: string;
  /** The whole picture in one sentence. */
  sentence: string;
  /** The figures behind it, one tap away. */
  table: ChartTable | null;
  /** Drawn once the width is known. */
  children: (width: number) => ReactNode;
};

/** Title, picture, table: what every chart has. */
export function ChartFrame({ title, note, sentence, table, children }: Props) {
  const [width, onLayout] = useWidth();
  const [open, setOpen] = useState(false);
  return (
    <View dataSet={{ printKeep: true }}>
      {title ? (
        <Heading level={2} size="title">
          {title}
        </Heading>
      ) : null}
      {note ? (
        <Text size="small" tone="soft" style={styles.note}>
          {note}
        </Text>
      ) : null}
      <View role="img" aria-label={sentence} onLayout={onLayout} style={styles.picture}>
        {width > 0 ? children(width) : null}
      </View>
      {table ? (
        <View dataSet={{ printHide: true }} style={styles.foot}>
          <TextLink
            label={open ? 'Hide the figures' : 'Show the figures'}
            describe={`${open ? 'Hide' : 'Show'} the figures${title ? `: ${title}` : ''}`}
            onPress={() => setOpen(!open)}
          />
        </View>
      ) : null}
      {table && open ? <Table label={title ?? sentence} columns={table.columns} rows={table.rows} tight /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  note: { marginBottom: 6 },
  picture: { minHeight: 1, overflow: 'visible' },
  foot: { alignItems: 'flex-start', marginTop: -space[1] },
});
