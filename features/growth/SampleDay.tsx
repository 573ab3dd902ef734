import { FormikProvider, useFormik } from 'formik';
import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { DateField } from '@/components/form/DateField';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { dayWords, isDay } from '@/shared/days';

type Props = { day: string; onDay: (day: string) => void };

/** Today unless it is said otherwise: samples out of a notebook have days of their own. */
export function SampleDay({ day, onDay }: Props) {
  const { today } = useRoom();
  const [open, setOpen] = useState(false);
  const form = useFormik({
    initialValues: { onDay: day },
    validateOnMount: true,
    validate: (typed) => (isDay(typed.onDay) ? {} : { onDay: 'Type a date such as 2026-05-14' }),
    onSubmit: () => {},
  });
  const typed = form.values.onDay;
  useEffect(() => {
    if (isDay(typed)) onDay(typed);
  }, [typed, onDay]);
  if (!open)
    return (
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center' }}>
        <Text>{`Measured ${dayWords(day, today)}`}</Text>
        <TextLink label="Another day" onPress={() => setOpen(true)} />
      </View>
    );
  return (
    <FormikProvider value={form}>
      <DateField name="onDay" label="Measured on" today={today} />
    </FormikProvider>
  );
}
