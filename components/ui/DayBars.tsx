import { StyleSheet, View } from 'react-native';
import { Rect, Svg } from 'react-native-svg';
import { space as distance } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Theme } from '@/components/theme/theme';
import { useWidth } from '@/hooks/useWidth';
import {
  type DayBar,
  type DayBarSize,
  type DayMark,
  dayBarMarks,
  dayBarsHeight,
  dayBarsWidth,
  daySizes,
  windowStart,
} from './dayBarMarks';
import { Text } from './Text';

type Props = {
  bars: readonly DayBar[];
  /** All of it in one sentence: "Day 22. Strip window 21 to 28. Release about 36." */
  sentence: string;
  size?: DayBarSize;
  /** "strip 21–28"; bold while the window is open. */
  windowWords?: string;
  windowOpen?: boolean;
  /** "release ~36". */
  endWords?: string;
  /** "day 1", on the hold's page. */
  startWords?: string;
  /** The last bar has just been recorded: it grows. */
  grow?: boolean;
};

/** One bar a day, spawn to release. */
export function DayBars({ bars, sentence, size = 'row', grow = false, ...words }: Props) {
  const theme = useTheme();
  const [space, onLayout] = useWidth();
  const width = dayBarsWidth(bars.length, space, size);
  const height = dayBarsHeight(size);
  // Checks stand above the field's own top; the picture is drawn that much lower and pulled up again.
  const lift = size === 'page' ? 0 : 9 - daySizes[size].top;
  return (
    <View role="img" aria-label={sentence} onLayout={onLayout}>
      <View style={{ height: height + lift, marginTop: -lift }}>
        {width > 0 ? (
          <Svg width={width} height={height + lift} viewBox={`0 ${-lift} ${width} ${height + lift}`}>
            {dayBarMarks(bars, width, size).map((mark) => (
              <DayRect
                key={mark.key}
                mark={mark}
                theme={theme}
                grow={grow && mark.look === 'fill' && mark.ink === 'ink'}
              />
            ))}
          </Svg>
        ) : null}
      </View>
      <DayWords bars={bars} width={width} size={size} {...words} />
    </View>
  );
}

export function DayRect({ mark, theme, grow = false }: { mark: DayMark; theme: Theme; grow?: boolean }) {
  const color = { ...theme.stage, ink: theme.ink, control: theme.control, band: theme.band }[mark.ink];
  const { x, y, width, height } = mark;
  const growing = grow ? { dataSet: { grow: true } } : null;
  if (mark.look === 'fill') return <Rect {...growing} x={x} y={y} width={width} height={height} fill={color} />;
  const line = mark.look === 'dashed' ? 1.3 : 1;
  return (
    <Rect
      x={x + line / 2}
      y={y + line / 2}
      width={Math.max(0.5, width - line)}
      height={Math.max(0.5, height - line)}
      fill="none"
      stroke={color}
      strokeWidth={line}
      strokeDasharray={mark.look === 'dashed' ? '2 2' : undefined}
    />
  );
}

type WordsProps = Pick<Props, 'bars' | 'windowWords' | 'windowOpen' | 'endWords' | 'startWords'> & {
  width: number;
  size: DayBarSize;
};

/** Captions under the window and the end. In rows the window's stands at one place, so that rows compare. */
function DayWords({ bars, width, size, windowWords, windowOpen = false, endWords, startWords }: WordsProps) {
  if (!windowWords && !endWords && !startWords) return null;
  const start = windowStart(bars, width, 'strip') ?? windowStart(bars, width, 'handOver') ?? 0;
  const at = size === 'row' ? width * 0.39 : Math.min(start, Math.max(0, width - 190));
  const startShown = startWords && at > 56;
  return (
    <View aria-hidden style={[styles.words, { width: width || '100%' }]}>
      {startShown ? (
        <Text size="label" tone="soft" style={styles.start}>
          {startWords}
        </Text>
      ) : null}
      <Text size="label" strong={windowOpen} tone={windowOpen ? 'ink' : 'soft'} whole style={{ marginLeft: at }}>
        {windowWords ?? ''}
      </Text>
      <Text size="label" tone="soft" whole style={styles.end}>
        {endWords ?? ''}
      </Text>
    </View>
  );
}

const styles = StyleSheet.create({
  words: { flexDirection: 'row', flexWrap: 'wrap', columnGap: distance[2], marginTop: 4 },
  start: { position: 'absolute', left: 0, top: 0 },
  end: { marginLeft: 'auto' },
});
