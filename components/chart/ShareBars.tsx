import { StyleSheet, View } from 'react-native';
import { Rect, Svg } from 'react-native-svg';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from '@/components/ui/Text';
import { shareWord } from './shareWord';

export type Share = {
  key: string;
  /** "DUMA-A08, wild". */
  word: string;
  /** 0 to 1. */
  share: number;
  /** The one that matters now: a founder the plan brings in. */
  marked?: boolean;
};

type Props = { shares: readonly Share[]; sentence: string };

const PER_BAR = 0.02;
const STEP = 6.2;
const HEIGHT = 34;

/** What each founder gives, a bar for every 2 %. Groups wrap where there are many. */
export function ShareBars({ shares, sentence }: Props) {
  const theme = useTheme();
  return (
    <View role="img" aria-label={sentence} style={styles.groups}>
      {shares.map(({ key, word, share, marked = false }) => {
        const count = Math.max(1, Math.round(share / PER_BAR));
        return (
          <View key={key}>
            <Svg width={count * STEP} height={HEIGHT}>
              {Array.from({ length: count }, (_, i) => i * STEP).map((x) => (
                <Rect
                  key={x}
                  x={x}
                  y={0}
                  width={4.3}
                  height={HEIGHT}
                  fill={marked ? theme.stage.subadult : theme.control}
                />
              ))}
            </Svg>
            <Text size="label" strong={marked} tone={marked ? 'ink' : 'soft'} whole style={styles.word}>
              {word}
            </Text>
            <Text size="label" strong whole>
              {shareWord(share)}
            </Text>
          </View>
        );
      })}
    </View>
  );
}

const styles = StyleSheet.create({
  groups: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space[2], rowGap: space[3] },
  word: { marginTop: 4 },
});
