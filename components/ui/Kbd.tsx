import { View } from 'react-native';
import { radius } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from './Code';
import { type Tone, toneColor } from './Text';

type Props = {
  letter: string;
  tone?: Tone;
  /** With room on its right, inside an input. */
  spaced?: boolean;
};

/** A key of the keyboard that does the same. */
export function Kbd({ letter, tone = 'ink', spaced = false }: Props) {
  const theme = useTheme();
  const borderColor = tone === 'ink' ? theme.control : toneColor(theme, tone);
  return (
    <View
      aria-hidden
      style={{
        borderWidth: 1,
        borderColor,
        borderRadius: radius.control,
        paddingHorizontal: 5,
        marginRight: spaced ? 14 : 0,
      }}
    >
      <Code size="label" tone={tone}>
        {letter}
      </Code>
    </View>
  );
}
