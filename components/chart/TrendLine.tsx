import { G, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type Day, daysBetween, formatDate } from '@/shared/days';
import { ChartFrame } from './ChartFrame';
import { ChartText } from './ChartText';
import { dayX, monthTicks, niceTicks, pathOf, straight, tickWord } from './scale';

export type TrendPoint = { day: Day; value: number };

type Props = {
  title?: string;
  note?: string;
  sentence: string;
  points: readonly TrendPoint[];
  unit: string;
  decimals?: number;
  /** The range kept: the band. */
  from?: number | null;
  to?: number | null;
  today: Day;
  height?: number;
};

const LEFT = 34;
const TOP = 8;
const FOOT = 22;
/** No line across a gap this long: nobody measured. */
const GAP_DAYS = 21;

/** A measured thing of the water over time; out of its range a reading is red. */
export function TrendLine({ title, note, sentence, points, unit, decimals = 1, ...rest }: Props) {
  return (
    <ChartFrame
      title={title}
      note={note}
      sentence={sentence}
      table={{
        columns: [
          { key: 'day', word: 'Measured', grow: 2 },
          { key: 'value', word: unit, right: true },
        ],
        rows: [...points].reverse().map((p, i) => ({
          key: `${p.day} ${i}`,
          cells: { day: formatDate(p.day), value: p.value.toFixed(decimals) },
        })),
      }}
    >
      {(width) => <TrendDrawing points={points} width={width} {...rest} />}
    </ChartFrame>
  );
}

type DrawingProps = Pick<Props, 'points' | 'from' | 'to' | 'today' | 'height'> & { width: number };

function TrendDrawing({ points, from = null, to = null, today, height = 128, width }: DrawingProps) {
  const theme = useTheme();
  const days = [...points.map((point) => point.day), today].sort();
  const [first, last] = [days[0] ?? today, days.at(-1) ?? today];
  const values = [...points.map((point) => point.value), from, to].filter((value) => value !== null);
  const ticks = niceTicks(Math.min(...values), Math.max(...values), 4);
  const base = height - FOOT;
  const y = straight([ticks[0] ?? 0, ticks.at(-1) ?? 1], base, TOP);
  const x = dayX(first, straight([0, Math.max(1, daysBetween(first, last))], LEFT, width - 6));
  const isOut = (value: number) => (from !== null && value < from) || (to !== null && value > to);
  const bandTop = to === null ? TOP : y(to);
  const bandBase = from === null ? base : y(from);
  return (
    <Svg width={width} height={height}>
      {from !== null || to !== null ? (
        <Rect
          x={LEFT}
          y={bandTop}
          width={width - 6 - LEFT}
          height={Math.max(0, bandBase - bandTop)}
          fill={theme.band}
        />
      ) : null}
      {ticks.map((tick, i) => (
        <G key={tick}>
          <Path d={`M${LEFT} ${y(tick)}H${width - 6}`} stroke={i === 0 ? theme.control : theme.ruleSoft} />
          <ChartText x={LEFT - 8} y={y(tick) + 4.5} anchor="end">
            {tickWord(tick, ticks)}
          </ChartText>
        </G>
      ))}
      {monthTicks(first, last, (width - LEFT) / 40)
        .filter((month) => x(month.day) < width - 24)
        .map((month) => (
          <G key={month.day}>
            <Path d={`M${x(month.day)} ${base}v5`} stroke={theme.control} />
            <ChartText x={x(month.day) + 3} y={base + 17}>
              {month.word}
            </ChartText>
          </G>
        ))}
      {runsOf(points).map((run) => (
        <Path
          key={run[0]?.day}
          d={pathOf(run.map((p) => [x(p.day), y(p.value)]))}
          fill="none"
          stroke={theme.ink2}
          strokeWidth={1.75}
        />
      ))}
      {points.map((p, i) => (
        <Rect
          // biome-ignore lint/suspicious/noArrayIndexKey: two readings may fall on one day
          key={`${p.day} ${i}`}
          x={x(p.day) - 2.5}
          y={y(p.value) - 6}
          width={5}
          height={12}
          fill={isOut(p.value) ? theme.trouble : theme.ink}
        />
      ))}
    </Svg>
  );
}

/** Stretches without a long gap. */
function runsOf(points: readonly TrendPoint[]): TrendPoint[][] {
  const runs: TrendPoint[][] = [];
  for (const point of points) {
    const before = runs.at(-1)?.at(-1);
    if (before && daysBetween(before.day, point.day) <= GAP_DAYS) runs.at(-1)?.push(point);
    else runs.push([point]);
  }
  return runs.filter((run) => run.length > 1);
}
