import { G, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Stage } from '@/components/theme/theme';
import { stageWords } from '@/components/theme/theme';
import { type Day, formatDate } from '@/shared/days';
import { ChartFrame } from './ChartFrame';
import { ChartText } from './ChartText';

/** Heads at the end of a week. */
export type HeadWeek = { day: Day; heads: number /** Of those once there, gone by now. */; gone: number; stage: Stage };

type Props = { weeks: readonly HeadWeek[]; sentence: string; height?: number };

const TOP = 16;
const FOOT = 20;

/** A bar a week; the hollow top is what is no longer there. */
export function HeadBars({ weeks, sentence, height = 96 }: Props) {
  return (
    <ChartFrame
      sentence={sentence}
      table={{
        columns: [
          { key: 'day', word: 'Week to', grow: 2 },
          { key: 'stage', word: 'Stage', grow: 2 },
          { key: 'heads', word: 'Heads', right: true },
        ],
        rows: weeks.map((week) => ({
          key: week.day,
          cells: { day: formatDate(week.day), stage: stageWords[week.stage], heads: String(week.heads) },
        })),
      }}
    >
      {(width) => <HeadDrawing weeks={weeks} width={width} height={height} />}
    </ChartFrame>
  );
}

function HeadDrawing({ weeks, width, height }: { weeks: readonly HeadWeek[]; width: number; height: number }) {
  const theme = useTheme();
  const base = height - FOOT;
  const most = Math.max(1, ...weeks.map((week) => week.heads + week.gone));
  const px = (base - TOP) / most;
  const gap = Math.min(3, (width / Math.max(1, weeks.length)) * 0.3);
  const step = Math.min(24, (width + gap) / Math.max(1, weeks.length));
  const end = Math.min(width, weeks.length * step);
  const [first, last] = [weeks[0], weeks.at(-1)];
  return (
    <Svg width={width} height={height}>
      <Path d={`M0 ${TOP}H${width}`} stroke={theme.ruleSoft} />
      <Path d={`M0 ${base + 0.5}H${width}`} stroke={theme.control} />
      {weeks.map((week, i) => {
        const top = base - week.heads * px;
        const gone = week.gone * px;
        return (
          <G key={week.day}>
            <Rect x={i * step} y={top} width={step - gap} height={week.heads * px} fill={theme.stage[week.stage]} />
            {gone > 1 ? (
              <Rect
                x={i * step + 0.5}
                y={top - gone + 0.5}
                width={step - gap - 1}
                height={Math.max(0.5, gone - 1)}
                fill="none"
                stroke={theme.control}
              />
            ) : null}
          </G>
        );
      })}
      {stageStarts(weeks, step).map(({ stage, x }) => (
        <ChartText key={stage} x={x} y={height - 4}>
          {stageWords[stage]}
        </ChartText>
      ))}
      {first ? (
        <ChartText x={0} y={TOP - 4}>
          {String(first.heads + first.gone)}
        </ChartText>
      ) : null}
      {last && weeks.length > 3 ? (
        <ChartText x={end - gap} y={TOP - 4} anchor="end" strong>
          {String(last.heads)}
        </ChartText>
      ) : null}
    </Svg>
  );
}

/** Where each stage begins, but for those whose word would run into the next. */
function stageStarts(weeks: readonly HeadWeek[], step: number): { stage: Stage; x: number }[] {
  const starts = weeks.flatMap((week, i) =>
    week.stage !== weeks[i - 1]?.stage ? [{ stage: week.stage, x: i * step }] : [],
  );
  return starts.filter((start, i) => {
    const next = starts[i + 1];
    return !next || next.x - start.x > stageWords[start.stage].length * 7.5;
  });
}
