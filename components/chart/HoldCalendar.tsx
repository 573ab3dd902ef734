import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { Svg } from 'react-native-svg';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { DayRect } from '@/components/ui/DayBars';
import { type DayBar, dayBarMarks, dayBarsHeight } from '@/components/ui/dayBarMarks';
import { Figure } from '@/components/ui/Figure';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import { useWidth } from '@/hooks/useWidth';
import { addDays, type Day, daysBetween, formatDay } from '@/shared/days';
import { CalendarHead } from './CalendarHead';

export type CalendarHold = {
  id: string;
  href: Href;
  /** Day of the hold. */
  figure: string;
  title: ReactNode;
  note: ReactNode;
  bars: readonly (DayBar & { on: Day })[];
  /** "Strip by Wed 20". */
  state: string;
  /** Something is to be done: bold. */
  due: boolean;
  /** All of it in one sentence. */
  label: string;
};

type Props = { holds: readonly CalendarHold[]; today: Day };

const WORDS = 230;
const ROW = 83;
const BAR_TOP = 0;

/** Every hold on one calendar with one line through today; wide screens only. */
export function HoldCalendar({ holds, today }: Props) {
  const theme = useTheme();
  const [width, onLayout] = useWidth();
  const { first, last } = spanOf(holds, today);
  const dayWidth = Math.min(12, (width - WORDS) / Math.max(1, daysBetween(first, last) + 1));
  const x = (day: Day) => WORDS + daysBetween(first, day) * dayWidth;
  const at = x(today) + dayWidth * 0.3;
  return (
    <View onLayout={onLayout}>
      <CalendarHead
        first={first}
        last={last}
        today={today}
        todayWord={formatDay(today, today).slice(0, 6)}
        x={x}
        width={width}
        height={holds.length * ROW}
      />
      {holds.map((hold) => (
        <Press
          key={hold.id}
          href={hold.href}
          aria-label={hold.label}
          style={({ pressed, hovered }) => [
            styles.row,
            { borderTopColor: theme.rule },
            pressed || hovered ? { backgroundColor: theme.well } : null,
          ]}
        >
          <View style={[styles.margin, { borderRightColor: theme.rule }]}>
            <Figure>{hold.figure}</Figure>
          </View>
          <View style={styles.words}>
            {hold.title}
            {hold.note}
          </View>
          {width > 0 ? <CalendarBars hold={hold} x={x} dayWidth={dayWidth} width={width} /> : null}
          <Text
            size="small"
            strong={hold.due}
            tone={hold.due ? 'ink' : 'soft'}
            whole
            style={{ position: 'absolute', left: at + 12, top: 55 }}
          >
            {hold.state}
          </Text>
        </Press>
      ))}
      <View style={[styles.today, { left: at, backgroundColor: theme.ink }]} />
      <View style={{ height: 1, backgroundColor: theme.rule }} />
    </View>
  );
}

type BarsProps = { hold: CalendarHold; x: (day: Day) => number; dayWidth: number; width: number };

function CalendarBars({ hold, x, dayWidth, width }: BarsProps) {
  const theme = useTheme();
  const from = hold.bars[0]?.on;
  if (!from) return null;
  // Today is the calendar's own line.
  const bars = hold.bars.map((bar) => (bar.when === 'today' ? { ...bar, when: 'past' as const } : bar));
  const own = bars.length * dayWidth - Math.min(2, dayWidth * 0.33);
  const left = x(from);
  return (
    <View aria-hidden style={[styles.bars, { left, top: BAR_TOP }]}>
      <Svg width={Math.min(own + 2, width - left)} height={dayBarsHeight('calendar')}>
        {dayBarMarks(bars, own, 'calendar').map((mark) => (
          <DayRect key={mark.key} mark={mark} theme={theme} />
        ))}
      </Svg>
    </View>
  );
}

/** From a fortnight before the first bar that matters to the end of the last, never under seven weeks. */
function spanOf(holds: readonly CalendarHold[], today: Day): { first: Day; last: Day } {
  const days = holds.flatMap((hold) => hold.bars.map((bar) => bar.on)).sort();
  const first = [days[0] ?? today, addDays(today, -21)].sort()[0] ?? today;
  const last = [days.at(-1) ?? today, addDays(today, 28)].sort().at(-1) ?? today;
  return { first: [first, addDays(today, -90)].sort()[1] ?? first, last: addDays(last, 2) };
}

const styles = StyleSheet.create({
  row: { minHeight: ROW, flexDirection: 'row', borderTopWidth: line.row },
  margin: { width: 45, alignItems: 'flex-end', paddingTop: 10, paddingRight: 10, borderRightWidth: line.row },
  words: { width: WORDS - 45, paddingLeft: 11, paddingTop: 8, paddingRight: 8 },
  bars: { position: 'absolute' },
  today: { position: 'absolute', top: 14, bottom: 0, width: 5 },
});
