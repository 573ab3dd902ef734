import { StyleSheet } from 'react-native';
import { target } from '@/components/theme/space';
import type { TextSize } from '@/components/theme/type';
import { type Action, Press } from './Press';
import { Text } from './Text';

type Props = Action & {
  label: string;
  size?: TextSize;
  /** Where several on a page read alike: "Lineage sheet of DUMA-26C". */
  describe?: string;
};

/** Underlined words on a line of their own, 48 px tall. */
export function TextLink({ label, size = 'small', describe, href, onPress }: Props) {
  return (
    <Press href={href} onPress={onPress} aria-label={describe ?? label} style={styles.hit}>
      <Text size={size} semi style={styles.words}>
        {label}
      </Text>
    </Press>
  );
}

const styles = StyleSheet.create({
  hit: { minHeight: target.least, justifyContent: 'center', flexShrink: 0 },
  words: { textDecorationLine: 'underline', textUnderlineOffset: 4, textDecorationThickness: 1 },
});
