import { StyleSheet, View } from 'react-native';
import { useSafeAreaInsets } from 'react-native-safe-area-context';
import { line, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { family } from '@/components/theme/type';
import { Icon } from '@/components/ui/Icon';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import { KeypadReadout, type ReadoutProps } from './KeypadReadout';
import { useKeypadKeys } from './useKeypadKeys';

type Props = ReadoutProps & {
  onChange: (value: string) => void;
  /** The tall key: "Next fish". It takes what is typed. */
  nextWord: string;
  onNext: () => void;
  /** The small key below it, "Finish sample"; apart from Next, so that a wet thumb does not end a sample. */
  finishWord?: string;
  onFinish?: () => void;
  /** The key beside the nought: half a millimetre, or a decimal point. */
  extra?: '.5' | '.';
  /** Most digits that make sense: three for millimetres. */
  digits?: number;
};

const ROWS = [
  ['1', '2', '3'],
  ['4', '5', '6'],
  ['7', '8', '9'],
] as const;

/** Digits for a wet thumb: 64 px keys fixed to the bottom. The keyboard's own digits work too. */
export function NumberKeypad(props: Props) {
  const { onChange, nextWord, onNext, finishWord, onFinish, extra = '.5', value } = props;
  const theme = useTheme();
  const insets = useSafeAreaInsets();
  const { press, erase } = useKeypadKeys(props);
  const edges = { borderColor: theme.rule };
  return (
    <View>
      <KeypadReadout {...props} />
      <View
        role="group"
        aria-label="Keypad"
        style={[
          styles.pad,
          { backgroundColor: theme.well, borderTopColor: theme.ruleStrong, paddingBottom: Math.max(20, insets.bottom) },
        ]}
      >
        <View style={styles.keys}>
          {ROWS.map((row) => (
            <View key={row[0]} style={styles.line}>
              {row.map((digit) => (
                <DigitKey key={digit} digit={digit} onPress={() => press(digit)} />
              ))}
            </View>
          ))}
          <View style={styles.line}>
            <Press
              aria-label="Erase the last digit"
              onPress={erase}
              onLongPress={() => onChange('')}
              style={[styles.key, edges]}
            >
              <Icon name="erase" />
            </Press>
            <DigitKey digit="0" onPress={() => press('0')} />
            <Press
              aria-label={extra === '.5' ? 'and a half' : 'decimal point'}
              onPress={() => press('.')}
              style={[styles.key, edges]}
            >
              <Text size="large" semi>
                {extra}
              </Text>
            </Press>
          </View>
        </View>
        <View style={styles.side}>
          <Press
            aria-label={nextWord}
            onPress={onNext}
            style={({ pressed }) => [
              styles.next,
              { backgroundColor: theme.actFill, opacity: pressed || value === '' ? 0.85 : 1 },
            ]}
          >
            <Text size="large" strong tone="inverse" align="center">
              {nextWord}
            </Text>
          </Press>
          {finishWord && onFinish ? (
            <Press aria-label={finishWord} onPress={onFinish} style={[styles.finish, edges]}>
              <Text size="small" semi align="center" style={styles.underlined}>
                {finishWord}
              </Text>
            </Press>
          ) : null}
        </View>
      </View>
    </View>
  );
}

function DigitKey({ digit, onPress }: { digit: string; onPress: () => void }) {
  const theme = useTheme();
  return (
    <Press
      aria-label={digit}
      onPress={onPress}
      style={({ pressed }) => [
        styles.key,
        { borderColor: theme.rule, backgroundColor: pressed ? theme.select : 'transparent' },
      ]}
    >
      <Text style={styles.digit}>{digit}</Text>
    </Press>
  );
}

const styles = StyleSheet.create({
  pad: { flexDirection: 'row', borderTopWidth: line.section },
  keys: { flexGrow: 1, flexShrink: 1 },
  line: { flexDirection: 'row', flexGrow: 1, minHeight: 78 },
  key: {
    flexGrow: 1,
    flexBasis: 0,
    minHeight: target.keypad,
    alignItems: 'center',
    justifyContent: 'center',
    borderRightWidth: line.row,
    borderBottomWidth: line.row,
  },
  digit: { fontFamily: family.figure, fontSize: 42, lineHeight: 44, fontWeight: '700' },
  side: { width: 104 },
  next: { flexGrow: 3, alignItems: 'center', justifyContent: 'center', paddingHorizontal: space[4] },
  finish: {
    minHeight: 78,
    alignItems: 'center',
    justifyContent: 'center',
    paddingHorizontal: space[2],
    borderBottomWidth: line.row,
  },
  underlined: { textDecorationLine: 'underline', textUnderlineOffset: 4, textDecorationThickness: 1, lineHeight: 18 },
});
