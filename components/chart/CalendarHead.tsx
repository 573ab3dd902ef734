import { StyleSheet, View } from 'react-native';
import { Path, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from '@/components/ui/Text';
import { addDays, type Day, formatShortDay, isoWeek } from '@/shared/days';

type Props = {
  first: Day;
  last: Day;
  today: Day;
  todayWord: string;
  x: (day: Day) => number;
  width: number;
  /** Of the rows that the week lines run down through. */
  height: number;
};

const TOP = 26;

/** Mondays, with the month where it changes; today in bold. Words too near to today's give way. */
export function CalendarHead({ first, last, today, todayWord, x, width, height }: Props) {
  const theme = useTheme();
  const mondays: Day[] = [];
  for (let day = addDays(first, (8 - isoWeek(first).weekday) % 7); day <= last; day = addDays(day, 7))
    mondays.push(day);
  if (width === 0) return <View style={{ height: TOP }} />;
  return (
    <View aria-hidden style={{ height: TOP }}>
      <View style={styles.lines}>
        <Svg width={width} height={height + TOP}>
          {mondays.map((day) => (
            <Path key={day} d={`M${x(day) + 0.5} 22V${height + TOP}`} stroke={theme.ruleSoft} />
          ))}
        </Svg>
      </View>
      {mondays.map((day, i) => {
        const near = Math.abs(x(day) + 18 - x(today)) < 58 || x(day) > width - 36;
        const before = mondays[i - 1];
        const word = before?.slice(0, 7) === day.slice(0, 7) ? String(Number(day.slice(8))) : formatShortDay(day);
        return near ? null : (
          <Text key={day} size="label" tone="soft" whole style={{ position: 'absolute', left: x(day) + 4, top: 0 }}>
            {word}
          </Text>
        );
      })}
      <Text size="label" strong whole style={{ position: 'absolute', left: x(today) - 2, top: 0 }}>
        {todayWord}
      </Text>
    </View>
  );
}

const styles = StyleSheet.create({ lines: { position: 'absolute', left: 0, top: 0 } });
