import { createContext, type ReactNode, use } from 'react';
import { Text as NativeText, type TextProps as NativeTextProps, type TextStyle } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Theme } from '@/components/theme/theme';
import { family, type TextSize, textMeasure } from '@/components/theme/type';

export type Tone = 'ink' | 'soft' | 'faint' | 'trouble' | 'inverse';

export const toneColor = (theme: Theme, tone: Tone): string =>
  ({ ink: theme.ink, soft: theme.ink2, faint: theme.ink3, trouble: theme.trouble, inverse: theme.actInk })[tone];

/** Size of the text around: a word inside a sentence keeps its size, colour and weight unless it says otherwise. */
const SizeContext = createContext<TextSize | null>(null);
export const useTextSize = (): TextSize | null => use(SizeContext);

export type TextProps = Omit<NativeTextProps, 'style' | 'children'> & {
  children?: ReactNode;
  /** Left out: `body`, or the size of the text around it. */
  size?: TextSize;
  tone?: Tone;
  strong?: boolean;
  semi?: boolean;
  /** Names of species. */
  italic?: boolean;
  align?: 'left' | 'center' | 'right';
  /** One line, cut with an ellipsis. */
  cut?: boolean;
  /** Never broken over two lines. */
  whole?: boolean;
  /** Position only; looks come from the props above. */
  style?: TextStyle;
};

/** All words on a screen. Figures of headlines are `Figure`, codes are `Code`. */
export function Text({
  size,
  tone,
  strong,
  semi,
  italic,
  align,
  cut = false,
  whole = false,
  style,
  children,
  ...rest
}: TextProps) {
  const theme = useTheme();
  const around = use(SizeContext);
  const breakpoint = useBreakpoint();
  const own = size ?? (around ? null : 'body');
  const weight = strong ? '700' : semi ? '600' : strong === false || semi === false || !around ? '400' : undefined;
  return (
    <SizeContext value={size ?? around ?? 'body'}>
      <NativeText
        {...rest}
        numberOfLines={cut ? 1 : rest.numberOfLines}
        style={[
          around ? null : base,
          own ? textMeasure(own, breakpoint) : null,
          tone ? { color: toneColor(theme, tone) } : around ? null : { color: theme.ink },
          weight ? { fontWeight: weight } : null,
          italic === undefined ? null : { fontStyle: italic ? 'italic' : 'normal' },
          align ? { textAlign: align } : null,
          whole ? nowrap : null,
          style,
        ]}
      >
        {children}
      </NativeText>
    </SizeContext>
  );
}

const base: TextStyle = { fontFamily: family.text, fontVariant: ['tabular-nums'] };
const nowrap: TextStyle = { whiteSpace: 'nowrap' };
