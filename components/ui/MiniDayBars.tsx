import { View } from 'react-native';
import { Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { DayBar } from './dayBarMarks';

type Props = { bars: readonly DayBar[]; sentence: string; width?: number };

const HEIGHT = 16;

/** A hold in one line of a list: what has been, today, the strip window, and a line for what is ahead. */
export function MiniDayBars({ bars, sentence, width = 150 }: Props) {
  const theme = useTheme();
  const step = width / Math.max(1, bars.length);
  const first = bars.findIndex((bar) => bar.strip);
  const open = bars.filter((bar) => bar.strip).length;
  const today = bars.findIndex((bar) => bar.when === 'today');
  return (
    <View role="img" aria-label={sentence} style={{ width, height: HEIGHT }}>
      <Svg width={width} height={HEIGHT}>
        {first >= 0 ? <Rect x={first * step} y={0} width={open * step} height={HEIGHT} fill={theme.band} /> : null}
        {bars.map((bar, i) =>
          bar.when === 'past' ? (
            <Rect
              key={bar.day}
              x={i * step}
              y={3}
              width={step * 0.62}
              height={10}
              fill={bar.unseen ? 'none' : theme.stage[bar.stage === 'guarded' ? 'fry' : bar.stage]}
              stroke={bar.unseen ? theme.stage.egg : undefined}
              strokeDasharray={bar.unseen ? '2 2' : undefined}
            />
          ) : null,
        )}
        {today >= 0 ? (
          <Rect x={today * step} y={0} width={Math.max(2, step * 0.62)} height={HEIGHT} fill={theme.ink} />
        ) : null}
        {today >= 0 ? <Path d={`M${(today + 1) * step} 12.5H${width}`} stroke={theme.control} /> : null}
      </Svg>
    </View>
  );
}
