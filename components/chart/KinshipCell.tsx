import { StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import type { KinFish } from './KinshipTable';
import { kinshipWord } from './kinshipWord';

export type KinshipValue = {
  /** Expected F of the young, 0 to 1. */
  f: number;
  /** How much of both pedigrees is known, 0 to 1: a low F from an unknown pedigree is not a low F. */
  known: number;
  /** No pair: same sex, or it cannot breed. */
  dim?: boolean;
};

/** As unrelated as second cousins' young or less; as close as full sibs' young. */
const LOW = 0.0625;
const FULL_SIBS = 0.25;

const PX_PER_F = 133;

type Props = {
  down: KinFish;
  across: KinFish;
  value: KinshipValue | null;
  limit: number;
  picked: boolean;
  onPick: (down: KinFish, across: KinFish) => void;
  small: boolean;
  column: number;
  place: { left: number; width: number; height: number };
};

/** Figure, bar, and how much is known behind it. */
export function KinshipCell({ down, across, value, limit, picked, onPick, small, column, place }: Props) {
  const theme = useTheme();
  const frame = [styles.cell, place, { borderLeftColor: theme.rule }];
  if (!value)
    return (
      <View role="cell" aria-colindex={column} style={[frame, styles.self, { backgroundColor: theme.well }]}>
        <Text size="label" tone="soft">
          {SAME}
        </Text>
      </View>
    );
  const { f, known, dim = false } = value;
  const over = f >= limit && !dim;
  const bold = f < LOW && !dim;
  const height = Math.max(2, Math.min(place.height - 8, f * PX_PER_F));
  const fill = dim ? theme.rule : over ? theme.trouble : theme.stage.subadult;
  const percent = `${Math.round(known * 100)} %`;
  return (
    <View role="cell" aria-colindex={column} style={frame}>
      <Press
        aria-pressed={picked}
        aria-label={`${across.code} with ${down.code}: F ${f.toFixed(3)}, ${percent} of the pedigree known${over ? ', at or over your limit' : ''}`}
        tabIndex={dim ? -1 : 0}
        onPress={() => onPick(down, across)}
        style={[styles.press, picked ? { borderWidth: 3, borderColor: theme.ink } : null]}
      >
        <View style={[styles.bar, { height, width: small ? 5 : 7, backgroundColor: fill }]} />
        {f >= FULL_SIBS && !dim ? <View style={[styles.triangle, { borderBottomColor: theme.trouble }]} /> : null}
        <Text size={small ? 'label' : 'body'} strong={bold} tone={dim ? 'faint' : bold ? 'ink' : 'soft'} align="right">
          {kinshipWord(f)}
        </Text>
        <Text size="label" tone="faint" align="right">
          {percent}
        </Text>
      </Press>
    </View>
  );
}

const SAME = '–';

const styles = StyleSheet.create({
  cell: { position: 'absolute', top: 0, borderLeftWidth: line.row },
  self: { alignItems: 'center', justifyContent: 'center' },
  press: { flexGrow: 1, justifyContent: 'center', paddingRight: 6 },
  bar: { position: 'absolute', left: 3, bottom: 2 },
  triangle: {
    position: 'absolute',
    right: 6,
    top: 2,
    width: 0,
    height: 0,
    borderLeftWidth: 5,
    borderRightWidth: 5,
    borderBottomWidth: 8,
    borderLeftColor: 'transparent',
    borderRightColor: 'transparent',
  },
});
