import { G, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { addDays, type Day, daysBetween, formatDate } from '@/shared/days';
import { ChartFrame } from './ChartFrame';
import { ChartText } from './ChartText';
import { dayX, monthTicks, straight } from './scale';

/** One hold: its days by stage, or grey when it was swallowed or lost. */
export type TimelineHold = {
  from: Day;
  to: Day;
  hatchOn: Day;
  swimOn: Day;
  failed: boolean;
  /** "Stripped, 34 fry". */
  end: string;
};

export type TimelineRow = { id: string; code: string; holds: readonly TimelineHold[] };

type Props = { rows: readonly TimelineRow[]; from: Day; today: Day; sentence: string };

const LEFT = 56;
const TOP = 22;
const ROW = 24;
const BAR_DAYS = 5;

/** Who held when: a line for each female, a bar for every five days. */
export function HoldTimeline({ rows, from, today, sentence }: Props) {
  return (
    <ChartFrame
      sentence={sentence}
      table={{
        columns: [
          { key: 'code', word: 'Female' },
          { key: 'from', word: 'Spawned', grow: 2 },
          { key: 'days', word: 'Days', right: true },
          { key: 'end', word: 'End', grow: 2 },
        ],
        rows: rows.flatMap((row) =>
          row.holds.map((hold) => ({
            key: `${row.id} ${hold.from}`,
            cells: {
              code: row.code,
              from: formatDate(hold.from),
              days: String(daysBetween(hold.from, hold.to) + 1),
              end: hold.end,
            },
          })),
        ),
      }}
    >
      {(width) => <TimelineDrawing rows={rows} from={from} today={today} width={width} />}
    </ChartFrame>
  );
}

function TimelineDrawing({ rows, from, today, width }: Omit<Props, 'sentence'> & { width: number }) {
  const theme = useTheme();
  const height = TOP + rows.length * ROW + 4;
  const x = dayX(from, straight([0, Math.max(1, daysBetween(from, today))], LEFT, width - 2));
  return (
    <Svg width={width} height={height}>
      {monthTicks(from, today, (width - LEFT) / 70).map((month) => (
        <G key={month.day}>
          <Path d={`M${x(month.day)} ${TOP - 6}V${height}`} stroke={theme.ruleSoft} />
          <ChartText x={x(month.day) + 3} y={12}>
            {month.word}
          </ChartText>
        </G>
      ))}
      {rows.map((row, i) => {
        const base = TOP + (i + 1) * ROW - 5;
        return (
          <G key={row.id}>
            <ChartText x={0} y={base - 4} code>
              {row.code}
            </ChartText>
            <Path d={`M${LEFT} ${base + 0.5}H${width}`} stroke={theme.rule} />
            {row.holds.flatMap((hold) =>
              barsOf(hold).map((bar) => (
                <Rect
                  key={`${hold.from} ${bar.day}`}
                  x={Math.max(LEFT, x(bar.day))}
                  y={base - 14}
                  width={Math.max(1.6, ((x(today) - x(from)) / daysBetween(from, today)) * BAR_DAYS * 0.66)}
                  height={14}
                  fill={bar.stage === null ? theme.control : theme.stage[bar.stage]}
                />
              )),
            )}
            {row.holds.length === 0 ? (
              <ChartText x={LEFT + 4} y={base - 4}>
                {NONE}
              </ChartText>
            ) : null}
          </G>
        );
      })}
      <Path d={`M${width - 1} ${TOP - 10}V${height}`} stroke={theme.ink} />
    </Svg>
  );
}

const NONE = 'no holds';

type TimelineBar = { day: Day; stage: 'egg' | 'wriggler' | 'fry' | null };

function barsOf(hold: TimelineHold): TimelineBar[] {
  const days = daysBetween(hold.from, hold.to) + 1;
  const stage = (day: Day) =>
    hold.failed ? null : day < hold.hatchOn ? 'egg' : day < hold.swimOn ? 'wriggler' : 'fry';
  return Array.from({ length: Math.max(1, Math.ceil(days / BAR_DAYS)) }, (_, i) => {
    const day = addDays(hold.from, i * BAR_DAYS);
    return { day, stage: stage(day) };
  });
}
