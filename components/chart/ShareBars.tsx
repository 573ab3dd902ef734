import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Text } from '@/components/ui/Text';
import { SharePips } from './SharePips';
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

const HEIGHT = 34;

/** What each founder gives, a bar for every 2 %. Groups wrap where there are many. */
export function ShareBars({ shares, sentence }: Props) {
  return (
    <View role="img" aria-label={sentence} style={styles.groups}>
      {shares.map(({ key, word, share, marked = false }) => {
        return (
          <View key={key}>
            <SharePips share={share} height={HEIGHT} marked={marked} />
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
