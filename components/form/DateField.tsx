import { useState } from 'react';
import { StyleSheet, TextInput, View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { line, radius, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { family, textMeasure } from '@/components/theme/type';
import { Text } from '@/components/ui/Text';
import { addDays, type Day, formatDay, fromToday, isDay } from '@/shared/days';
import { DayChoices } from './DayChoices';
import { FieldFrame } from './FieldFrame';
import { StepKey } from './StepKey';
import { typedDay } from './typedDay';
import { describedBy, useFieldState } from './useFieldState';

export type DayChoice = { word: string; day: Day };

type Props = {
  name: string;
  label: string;
  /** The fishroom's day, from `useRoom()`. */
  today: Day;
  /** One tap each: "Yesterday", "Last water change". */
  choices?: DayChoice[];
  /** Life events are never after today; collections are. */
  latest?: Day | null;
  earliest?: Day;
  hint?: string;
  aside?: string;
  /** The section's head says the label already. */
  quiet?: boolean;
};

/** A calendar day: stepped by one, typed ("12 May", "12.5.", "-3"), or chosen. */
export function DateField({ name, label, today, choices = [], latest = today, earliest, hint, aside, quiet }: Props) {
  const field = useFieldState(name);
  const theme = useTheme();
  const px = textMeasure('title', useBreakpoint());
  const [typing, setTyping] = useState<string | null>(null);
  const day = isDay(field.text) ? field.text : null;
  const canGo = (to: Day) => (latest === null || to <= latest) && (earliest === undefined || to >= earliest);
  const step = (by: number) => {
    const to = day ? addDays(day, by) : today;
    setTyping(null);
    if (canGo(to)) field.change(to);
  };
  const settle = () => {
    if (typing !== null) field.change(typing.trim() === '' ? '' : (typedDay(typing, today) ?? typing.trim()));
    setTyping(null);
    field.leave();
  };
  const shown = typing ?? (day ? formatDay(day, today) : field.text);
  return (
    <FieldFrame label={label} hint={hint} aside={aside} field={field} quiet={quiet}>
      <View
        dataSet={{ field: true }}
        style={[
          styles.frame,
          { borderColor: field.error ? theme.trouble : theme.control, backgroundColor: theme.well },
        ]}
      >
        <StepKey frameless icon="minus" label={`${label}: one day earlier`} onPress={() => step(-1)} />
        <View style={[styles.middle, { borderColor: theme.control }]}>
          <TextInput
            role="spinbutton"
            aria-label={label}
            aria-valuetext={day ? `${formatDay(day, today)}, ${fromToday(day, today)}` : 'no day'}
            aria-invalid={field.error !== null || undefined}
            aria-describedby={describedBy(field, hint)}
            autoComplete="off"
            value={shown}
            placeholder="12 May"
            placeholderTextColor={theme.ink3}
            selectTextOnFocus
            onChangeText={setTyping}
            onBlur={settle}
            onSubmitEditing={settle}
            onKeyPress={(event) => {
              const { key } = event.nativeEvent;
              if (key !== 'ArrowUp' && key !== 'ArrowDown') return;
              event.preventDefault();
              step(key === 'ArrowUp' ? 1 : -1);
            }}
            style={[px, styles.input, { color: theme.ink }]}
          />
          {day ? (
            <Text size="label" tone="soft" aria-hidden>
              {fromToday(day, today)}
            </Text>
          ) : null}
        </View>
        <StepKey
          frameless
          icon="plus"
          label={`${label}: one day later`}
          unavailable={day !== null && !canGo(addDays(day, 1))}
          onPress={() => step(1)}
        />
      </View>
      <DayChoices label={label} choices={choices} day={day} onPick={field.change} />
    </FieldFrame>
  );
}

const styles = StyleSheet.create({
  frame: { flexDirection: 'row', minHeight: 60, borderWidth: line.control, borderRadius: radius.control },
  middle: {
    flexGrow: 1,
    flexShrink: 1,
    flexBasis: 0,
    minWidth: 0,
    alignItems: 'center',
    justifyContent: 'center',
    borderLeftWidth: line.row,
    borderRightWidth: line.row,
    paddingVertical: space[1],
  },
  input: {
    width: '100%',
    textAlign: 'center',
    fontFamily: family.text,
    fontWeight: '700',
    fontVariant: ['tabular-nums'],
  },
});
