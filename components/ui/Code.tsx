import { Text as NativeText, type TextStyle } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { useTheme } from '@/components/theme/ThemeProvider';
import { family, type TextSize, textMeasure } from '@/components/theme/type';
import { type Tone, toneColor, useTextSize } from './Text';

type Props = {
  children: string;
  /** Left out: the size of the text around it. */
  size?: TextSize;
  tone?: Tone;
  /** A code may break in a narrow column where it is long. */
  cut?: boolean;
  style?: TextStyle;
};

/** A fish, brood, colony, tank, order or issue: slashed zero, never the condensed face. */
export function Code({ children, size, tone, cut, style }: Props) {
  const theme = useTheme();
  const around = useTextSize();
  const breakpoint = useBreakpoint();
  const px = textMeasure(size ?? around ?? 'body', breakpoint);
  return (
    <NativeText
      numberOfLines={cut ? 1 : undefined}
      style={[
        face,
        size || !around ? px : null,
        { letterSpacing: -0.02 * px.fontSize },
        tone ? { color: toneColor(theme, tone) } : around ? null : { color: theme.ink },
        style,
      ]}
    >
      {children}
    </NativeText>
  );
}

const face: TextStyle = { fontFamily: family.code, fontWeight: '600', whiteSpace: 'nowrap' };
