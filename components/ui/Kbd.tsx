import { View } from 'react-native';
import { radius } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from './Code';
import { type Tone, toneColor } from './Text';

/** A key of the keyboard that does the same. */
export function Kbd({ letter, tone = 'ink' }: { letter: string; tone?: Tone }) {
  const theme = useTheme();
  const borderColor = tone === 'ink' ? theme.control : toneColor(theme, tone);
  return (
    <View aria-hidden style={{ borderWidth: 1, borderColor, borderRadius: radius.control, paddingHorizontal: 5 }}>
      <Code size="label" tone={tone}>
        {letter}
      </Code>
    </View>
  );
}
