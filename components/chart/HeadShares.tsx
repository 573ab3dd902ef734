import { StyleSheet, View } from 'react-native';
import { Rect, Svg } from 'react-native-svg';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Theme } from '@/components/theme/theme';
import { Figure } from '@/components/ui/Figure';
import { Text } from '@/components/ui/Text';
import { useWidth } from '@/hooks/useWidth';

export type HeadShare = {
  key: string;
  heads: number;
  /** "This order", an order's number, "Available". */
  word: string;
  /** `this` is ink, `other` grey, `left` outlined. */
  kind: 'this' | 'other' | 'left';
};

type Props = { shares: readonly HeadShare[]; sentence: string; height?: number };

const MOST_BARS = 90;

/** A bar a head: where the fish of a brood stand. Large broods draw a bar for several. */
export function HeadShares({ shares, sentence, height = 64 }: Props) {
  const theme = useTheme();
  const [width, onLayout] = useWidth();
  const heads = shares.reduce((sum, share) => sum + share.heads, 0);
  const perBar = Math.max(1, Math.ceil(heads / MOST_BARS));
  const bars = shares.flatMap((share) => Array.from({ length: Math.ceil(share.heads / perBar) }, () => share.kind));
  const step = Math.min(16, width / Math.max(1, bars.length));
  return (
    <View role="img" aria-label={sentence} onLayout={onLayout}>
      <View style={{ height }}>
        {width > 0 ? (
          <Svg width={width} height={height}>
            {bars.map((kind, i) => (
              <Rect
                // biome-ignore lint/suspicious/noArrayIndexKey: bars of one kind are alike
                key={i}
                x={i * step + 0.5}
                y={0.5}
                width={Math.max(1, step * 0.72)}
                height={height - 1}
                {...lookOf(kind, theme)}
              />
            ))}
          </Svg>
        ) : null}
      </View>
      <View style={styles.words}>
        {shares.map((share) => (
          <View key={share.key} style={styles.share}>
            <Figure>{String(share.heads)}</Figure>
            <Text size="label" strong={share.kind === 'this'} tone={share.kind === 'this' ? 'ink' : 'soft'}>
              {share.word}
            </Text>
          </View>
        ))}
      </View>
    </View>
  );
}

const lookOf = (kind: HeadShare['kind'], theme: Theme) =>
  ({
    this: { fill: theme.ink, stroke: theme.ink },
    other: { fill: theme.control, stroke: theme.control },
    left: { fill: 'none', stroke: theme.control },
  })[kind];

const styles = StyleSheet.create({
  words: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space[6], rowGap: space[2], marginTop: space[2] },
  share: { minWidth: 48 },
});
