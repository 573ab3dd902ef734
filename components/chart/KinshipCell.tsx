import { Text as NativeText, StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import type { Theme } from '@/components/theme/theme';
import { family } from '@/components/theme/type';
import { elementOf } from '@/components/ui/elementOf';
import type { KinFish } from './KinshipTable';
import type { KinshipSizes } from './kinshipSizes';
import { kinshipWord } from './kinshipWord';

export type KinshipValue = {
  /** Kinship, which is the expected F of their young, 0 to 1; of a fish with itself (1 + F) / 2. */
  f: number;
  /** How far back the shallower of both pedigrees is known: "1.5 gen", "wild", "none". A low F from an unknown pedigree is not a low F. */
  known: string;
  /** The same read aloud. */
  knownSaid: string;
  /** No pair: same sex. */
  dim?: boolean;
  /** A fish with itself. */
  self?: boolean;
};

/** As unrelated as second cousins' young or less; as close as full sibs' young. */
const LOW = 0.0625;
const FULL_SIBS = 0.25;

const PX_PER_F = 133;

type Props = {
  down: KinFish;
  across: KinFish;
  value: KinshipValue;
  limit: number;
  theme: Theme;
  picked: boolean;
  reachable: boolean;
  row: number;
  column: number;
  left: number;
  sizes: KinshipSizes;
};

/**
 * Figure, bar, and how much is known behind it. There are hundreds of them, drawn anew with every letter of a search: plain
 * views, pressed by way of the table.
 */
export function KinshipCell(props: Props) {
  const { value, limit, theme, picked, reachable, row, column, left, sizes } = props;
  const { f, known, dim = false, self = false } = value;
  const quiet = dim || self;
  const over = f >= limit && !quiet;
  const bold = f < LOW && !quiet;
  const height = Math.max(2, Math.min(sizes.row - 9, f * PX_PER_F));
  const fill = quiet ? theme.rule : over ? theme.trouble : theme.stage.subadult;
  return (
    <View
      ref={asGridCell}
      aria-selected={picked}
      aria-colindex={column + 2}
      aria-label={said(props, over)}
      tabIndex={reachable ? 0 : -1}
      dataSet={{ cell: `${row} ${column}` }}
      style={[
        styles.cell,
        { left, width: sizes.column, height: sizes.row - 1, borderLeftColor: theme.rule },
        self ? { backgroundColor: theme.well } : null,
        picked ? { borderWidth: 3, borderColor: theme.ink } : null,
      ]}
    >
      <View style={[styles.bar, { height, backgroundColor: fill }]} />
      {f >= FULL_SIBS && !quiet ? <View style={[styles.triangle, { borderBottomColor: theme.trouble }]} /> : null}
      <NativeText style={[bold ? styles.boldFigure : styles.figure, { color: bold ? theme.ink : theme.ink2 }]}>
        {kinshipWord(f)}
      </NativeText>
      <NativeText style={[styles.known, { color: theme.ink2 }]}>{known}</NativeText>
    </View>
  );
}

/** The native types know no such role. */
const asGridCell = (view: View | null) => elementOf(view)?.setAttribute('role', 'gridcell');

function said({ down, across, value }: Props, over: boolean): string {
  const whom = value.self ? `${down.code} with itself` : `${across.code} with ${down.code}`;
  const notes = `${over ? ', at or over the limit' : ''}${value.dim ? ', no pair' : ''}`;
  return `${whom}: kinship ${value.f.toFixed(3)}${notes}, ${value.knownSaid}`;
}

const figure = {
  fontFamily: family.text,
  fontSize: 18,
  lineHeight: 22,
  textAlign: 'right',
  fontVariant: ['tabular-nums'],
} as const;

const styles = StyleSheet.create({
  cell: {
    position: 'absolute',
    top: 0,
    borderLeftWidth: line.row,
    justifyContent: 'center',
    paddingRight: 6,
    cursor: 'pointer',
  },
  bar: { position: 'absolute', left: 3, bottom: 2, width: 7 },
  figure: { ...figure, fontVariant: ['tabular-nums'] },
  boldFigure: { ...figure, fontVariant: ['tabular-nums'], fontWeight: '700' },
  known: { fontFamily: family.text, fontSize: 13, lineHeight: 16, textAlign: 'right' },
  triangle: {
    position: 'absolute',
    left: 14,
    top: 5,
    width: 0,
    height: 0,
    borderLeftWidth: 5,
    borderRightWidth: 5,
    borderBottomWidth: 8,
    borderLeftColor: 'transparent',
    borderRightColor: 'transparent',
  },
});
