import { View } from 'react-native';
import { G, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Stage } from '@/components/theme/theme';
import { useWidth } from '@/hooks/useWidth';
import { ChartText } from './ChartText';
import { niceTicks, straight, tickWord } from './scale';

type Props = {
  /** In the unit shown, in the order they were taken: the last one is framed. */
  lengths: readonly number[];
  mean: number | null;
  /** One standard deviation either side: the band. */
  sd: number | null;
  stage: Stage;
  sentence: string;
};

const HEIGHT = 84;
const BASE = 62;

/** The lengths of a sample while it is taken, each a bar on one scale. */
export function LengthStrip({ lengths, mean, sd, stage, sentence }: Props) {
  const theme = useTheme();
  const [width, onLayout] = useWidth();
  const least = Math.min(...lengths);
  const most = Math.max(...lengths);
  const pad = Math.max(1, (most - least) * 0.2, most * 0.05);
  const ticks = lengths.length > 0 ? niceTicks(least - pad, most + pad, 5) : [];
  const x = straight([ticks[0] ?? 0, ticks.at(-1) ?? 1], 16, width - 16);
  return (
    <View role="img" aria-label={sentence} onLayout={onLayout} style={{ height: HEIGHT }}>
      {width > 0 ? (
        <Svg width={width} height={HEIGHT}>
          {mean !== null && sd !== null ? (
            <Rect
              x={x(mean - sd)}
              y={12}
              width={Math.max(1, x(mean + sd) - x(mean - sd))}
              height={50}
              fill={theme.band}
            />
          ) : null}
          <Path d={`M0 ${BASE}H${width}`} stroke={theme.control} />
          {ticks.map((tick) => (
            <G key={tick}>
              <Path d={`M${x(tick)} ${BASE}v5`} stroke={theme.control} />
              <ChartText x={x(tick)} y={80} anchor="middle">
                {tickWord(tick, ticks)}
              </ChartText>
            </G>
          ))}
          {lengths.map((length, i) => {
            const last = i === lengths.length - 1;
            return (
              <Rect
                // biome-ignore lint/suspicious/noArrayIndexKey: two fish may be equally long
                key={i}
                {...(last ? { dataSet: { grow: true } } : {})}
                x={x(length) - 3}
                y={28}
                width={6}
                height={34}
                fill={theme.stage[stage]}
                stroke={last ? theme.ink : undefined}
                strokeWidth={last ? 2 : 0}
              />
            );
          })}
          {mean !== null ? <Path d={`M${x(mean)} 4V${BASE}`} stroke={theme.ink} strokeWidth={2} /> : null}
        </Svg>
      ) : null}
    </View>
  );
}
