import { Text as NativeText, type TextStyle } from 'react-native';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type FigureSize, family, figurePx } from '@/components/theme/type';
import { type Tone, toneColor } from './Text';

type Props = {
  /** Digits, with `±`, `.`, `:` or `−`; never letters or codes. */
  children: string;
  size?: FigureSize;
  /** A small sign after it: "%". */
  after?: string;
  tone?: Tone;
};

/** A number that stands like a bar: margin figures, headlines, the day of a hold. */
export function Figure({ children, size = 's', after, tone = 'ink' }: Props) {
  const color = toneColor(useTheme(), tone);
  const px = figurePx[size];
  return (
    <NativeText style={[face, { color, fontSize: px, lineHeight: px * 0.95 }, size === 'xl' ? tight : null]}>
      {children}
      {after ? <NativeText style={{ fontSize: Math.round(px * 0.58), lineHeight: 1 }}>{after}</NativeText> : null}
    </NativeText>
  );
}

const face: TextStyle = {
  fontFamily: family.figure,
  fontWeight: '700',
  fontVariant: ['tabular-nums'],
  whiteSpace: 'nowrap',
};
const tight: TextStyle = { letterSpacing: -2.5 };
