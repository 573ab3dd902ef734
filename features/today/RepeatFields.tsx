import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { isDay, isoWeek } from '@/shared/days';
import { weekdayWord } from '@/shared/today/repeat';

type Props = { repeats: 'once' | 'days' | 'weekday'; dueOn: string };

/** Once, so many days after it was done, or on the weekday of the day it is due. */
export function RepeatFields({ repeats, dueOn }: Props) {
  const weekday = isDay(dueOn) ? weekdayWord(isoWeek(dueOn).weekday) : 'its weekday';
  return (
    <>
      <SegmentedField
        name="repeats"
        label="How often"
        choices={[
          { value: 'once', word: 'Once' },
          { value: 'days', word: 'After days' },
          { value: 'weekday', word: `On ${weekday}` },
        ]}
        hint={HINTS[repeats]}
      />
      {repeats === 'days' ? (
        <NumberField name="everyDays" label="Again after" unit="days" whole step={1} least={1} />
      ) : null}
      {repeats === 'weekday' ? (
        <NumberField name="everyWeeks" label="Every" unit="weeks" whole step={1} least={1} />
      ) : null}
    </>
  );
}

const HINTS = {
  once: 'Done is done.',
  days: 'Counted from the day it was done.',
  weekday: 'It keeps its weekday, however late it was done.',
};
