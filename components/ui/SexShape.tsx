import { View } from 'react-native';
import { Circle, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type Tone, toneColor } from './Text';

export type Sex = 'male' | 'female' | 'unknown';

const words: Record<Sex, string> = { male: 'male', female: 'female', unknown: 'sex unknown' };

type Props = {
  sex: Sex;
  /** 13 to 18 px. */
  size?: number;
  /** Dashed: possible, not certain. */
  possible?: boolean;
  tone?: Tone;
};

/** The pedigree's shapes: square male, circle female, diamond unknown. Sex is never a letter. */
export function SexShape({ sex, size = 15, possible = false, tone = 'ink' }: Props) {
  const stroke = {
    fill: 'none',
    stroke: toneColor(useTheme(), tone),
    strokeWidth: 1.75,
    ...(possible ? { strokeDasharray: '3 2.2' } : {}),
  };
  return (
    <View
      role="img"
      aria-label={possible ? `possibly ${words[sex]}` : words[sex]}
      style={{ width: size, height: size, flexShrink: 0 }}
    >
      <Svg width={size} height={size} viewBox="0 0 16 16">
        {sex === 'male' ? <Rect x={1.5} y={1.5} width={13} height={13} {...stroke} /> : null}
        {sex === 'female' ? <Circle cx={8} cy={8} r={6.7} {...stroke} /> : null}
        {sex === 'unknown' ? <Path d="M8 .9L15.1 8 8 15.1.9 8z" {...stroke} /> : null}
      </Svg>
    </View>
  );
}
