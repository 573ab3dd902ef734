import { View } from 'react-native';
import { Path, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type IconMark, type IconName, iconMarks } from './iconMarks';
import { type Tone, toneColor } from './Text';

type Props = {
  name: IconName;
  /** Side in px; 24 on rows, 28 in the Record cell. */
  size?: number;
  tone?: Tone;
  /** Stroke on the 24 px square. */
  width?: number;
  /** Only where no word beside it says the same. */
  label?: string;
};

/** One icon of the set. Silent to a screen reader unless it has a label. */
export function Icon({ name, size = 24, tone = 'ink', width = 1.75, label }: Props) {
  const color = toneColor(useTheme(), tone);
  const marks: IconMark[] = iconMarks[name];
  return (
    <View
      {...(label ? { role: 'img', 'aria-label': label } : { 'aria-hidden': true })}
      style={{ width: size, height: size }}
    >
      <Svg width={size} height={size} viewBox="0 0 24 24" fill="none">
        {marks.map((mark) =>
          mark.filled ? (
            <Path key={mark.d} d={mark.d} fill={color} fillRule="evenodd" />
          ) : (
            <Path key={mark.d} d={mark.d} stroke={color} strokeWidth={mark.width ?? width} strokeMiterlimit={6} />
          ),
        )}
      </Svg>
    </View>
  );
}
