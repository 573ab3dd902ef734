import { View } from 'react-native';
import { Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';

const STEP = 11;
const HEIGHT = 34;

/** What is left after each generation, 0 to 1: today solid, what is expected dashed. */
export function DiversityBars({ values, sentence }: { values: readonly number[]; sentence: string }) {
  const theme = useTheme();
  return (
    <View role="img" aria-label={sentence}>
      <Svg width={values.length * STEP} height={HEIGHT}>
        {values.map((value, i) => {
          const height = Math.max(2, value * (HEIGHT - 2));
          const place = { x: i * STEP + 1, y: HEIGHT - 1 - height, width: 7, height };
          return i === 0 ? (
            <Rect key="today" {...place} fill={theme.ink} />
          ) : (
            <Rect key={place.x} {...place} fill="none" stroke={theme.ink2} strokeWidth={1.25} strokeDasharray="3 2" />
          );
        })}
      </Svg>
    </View>
  );
}
