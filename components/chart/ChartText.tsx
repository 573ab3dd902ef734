import { Text as SvgText } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { family } from '@/components/theme/type';

type Props = {
  x: number;
  y: number;
  children: string;
  anchor?: 'start' | 'middle' | 'end';
  strong?: boolean;
  /** Codes on a chart. */
  code?: boolean;
  size?: number;
  color?: string;
};

/** Words on a drawing, 13 px. The sentence and the table say the same to those who need them larger. */
export function ChartText({ x, y, children, anchor = 'start', strong = false, code = false, size = 13, color }: Props) {
  const theme = useTheme();
  return (
    <SvgText
      x={x}
      y={y}
      textAnchor={anchor}
      fontFamily={code ? family.code : family.text}
      fontSize={size}
      fontWeight={code ? '600' : strong ? '700' : '400'}
      letterSpacing={code ? -0.02 * size : undefined}
      fill={color ?? (strong || code ? theme.ink : theme.ink2)}
    >
      {children}
    </SvgText>
  );
}
