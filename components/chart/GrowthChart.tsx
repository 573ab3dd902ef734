import { G, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Stage } from '@/components/theme/theme';
import { type Day, formatDate } from '@/shared/days';
import { ChartFrame } from './ChartFrame';
import { ChartText } from './ChartText';
import { type GrowthField, growthField } from './growthField';
import { pathOf } from './scale';
import { TargetMark } from './TargetMark';

/** One sample: mean and its ± 1 SD, in the unit shown. */
export type GrowthSample = { day: Day; mean: number; low: number; high: number; fish: number };
export type CurvePoint = { day: Day; value: number; low: number; high: number };

export type GrowthTarget = {
  value: number;
  /** "5 cm". */
  word: string;
  /** When half are there, and the range of that day; null when it lies outside of the forecast. */
  day: Day | null;
  from: Day | null;
  to: Day | null;
};

export type GrowthChartProps = {
  /** "Half at 5 cm by 2 Jun, four in five by 20 Jun", or "Needs 2 more samples". */
  title: string;
  /** "25 May to 16 Jun · 7 samples · total length, cm". */
  note: string;
  unit: string;
  sentence: string;
  samples: readonly GrowthSample[];
  /** The fit, up to the last sample or today; empty with fewer than three samples: then only points are drawn. */
  fit?: readonly CurvePoint[];
  forecast?: readonly CurvePoint[];
  target?: GrowthTarget | null;
  today: Day;
  /** Of the fish now: the curve's colour. */
  stage: Stage;
  height?: number;
};

/** Measured boxes, fitted line, dashed forecast in its band. Length starts at 0. */
export function GrowthChart(props: GrowthChartProps) {
  const { title, note, sentence, samples, unit, height } = props;
  const word = (value: number) => value.toFixed(unit === 'mm' ? 1 : 2);
  return (
    <ChartFrame
      title={title}
      note={note}
      sentence={sentence}
      table={{
        columns: [
          { key: 'day', word: 'Measured', grow: 2 },
          { key: 'fish', word: 'Fish', right: true },
          { key: 'mean', word: `Mean, ${unit}`, right: true },
          { key: 'sd', word: '± 1 SD', right: true },
        ],
        rows: samples.map((s) => ({
          key: s.day,
          cells: { day: formatDate(s.day), fish: String(s.fish), mean: word(s.mean), sd: word((s.high - s.low) / 2) },
        })),
      }}
    >
      {(width) => <GrowthDrawing {...props} field={growthField(props, width, height ?? (width < 420 ? 216 : 316))} />}
    </ChartFrame>
  );
}

function GrowthDrawing({
  samples,
  fit = [],
  forecast = [],
  target,
  today,
  stage,
  field,
}: GrowthChartProps & { field: GrowthField }) {
  const theme = useTheme();
  const { x, y, width, height, left, right } = field;
  const line = (points: readonly CurvePoint[]) => pathOf(points.map((p) => [x(p.day), y(p.value)]));
  const band = (points: readonly CurvePoint[]) =>
    `${pathOf([...points.map((p) => [x(p.day), y(p.high)] as const), ...[...points].reverse().map((p) => [x(p.day), y(p.low)] as const)])}Z`;
  const curve = { fill: 'none', stroke: theme.stage[stage], strokeWidth: 2.5 };
  return (
    <Svg width={width} height={height}>
      <GrowthAxes field={field} />
      {fit.length > 1 ? <Path d={band(fit)} fill={theme.band} /> : null}
      {forecast.length > 1 ? <Path d={band(forecast)} fill={theme.band} /> : null}
      {fit.length > 1 ? <Path d={line(fit)} {...curve} /> : null}
      {forecast.length > 1 ? <Path d={line(forecast)} {...curve} strokeDasharray="5 4" /> : null}
      {x(today) >= left && x(today) <= right ? <TodayLine field={field} at={x(today)} /> : null}
      {samples.map((s) => (
        <G key={s.day}>
          <Rect
            x={x(s.day) - 2.5}
            y={y(s.high)}
            width={5}
            height={Math.max(1, y(s.low) - y(s.high))}
            fill={theme.ground}
            stroke={theme.ink2}
            strokeWidth={1.25}
          />
          <Path d={`M${x(s.day) - 6} ${y(s.mean)}h12`} stroke={theme.ink} strokeWidth={3} />
        </G>
      ))}
      {target ? <TargetMark target={target} field={field} /> : null}
    </Svg>
  );
}

function GrowthAxes({ field }: { field: GrowthField }) {
  const theme = useTheme();
  const { x, y, left, right, base, ticks, months, word } = field;
  return (
    <G>
      {ticks.map((tick, i) => (
        <G key={tick}>
          <Path d={`M${left} ${y(tick)}H${right}`} stroke={i === 0 ? theme.control : theme.ruleSoft} />
          <ChartText x={left - 8} y={y(tick) + 4.5} anchor="end">
            {word(tick)}
          </ChartText>
        </G>
      ))}
      {months.map((month) => (
        <G key={month.day}>
          <Path d={`M${x(month.day)} ${base}v5`} stroke={theme.control} />
          <ChartText x={x(month.day) + 3} y={base + 18}>
            {month.word}
          </ChartText>
        </G>
      ))}
    </G>
  );
}

function TodayLine({ field, at }: { field: GrowthField; at: number }) {
  const theme = useTheme();
  const nearLeft = at < field.left + 60;
  const word = 'today';
  return (
    <G>
      <Path d={`M${at} ${field.top}V${field.base}`} stroke={theme.ink} />
      <ChartText x={nearLeft ? at + 6 : at - 6} y={field.top + 4} anchor={nearLeft ? 'start' : 'end'} strong>
        {word}
      </ChartText>
    </G>
  );
}
