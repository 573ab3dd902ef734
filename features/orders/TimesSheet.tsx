import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { IconButton } from '@/components/ui/IconButton';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { addDays, DayText } from '@/shared/days';
import { agreeTime, type OrderPage, offerTimes } from '@/shared/orders/contract';
import { timeWords } from '@/shared/orders/times';
import { useAct } from './queries';

const Draft = z.strictObject({
  day: DayText,
  clock: z
    .string('Type a time')
    .check(z.trim(), z.regex(/^(?:[01]?\d|2[0-3])[:.][0-5]\d$/, 'Type a time such as 10:30')),
});

const localTime = ({ day, clock }: z.output<typeof Draft>): string =>
  `${day}T${clock.replace('.', ':').padStart(5, '0')}`;

/** Times from which the buyer picks; or one that was agreed by telephone. */
export function TimesSheet({ told, onClose }: { told: OrderPage; onClose: () => void }) {
  const room = useRoom();
  const act = useAct();
  const { order } = told;
  const [times, setTimes] = useState(told.offeredTimes);
  const params = { roomId: room.id, orderId: order.id };
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { day: addDays(room.today, 1), clock: '17:00' },
    save: async (draft) => setTimes([...new Set([...times, localTime(draft)])].sort()),
  });
  const done = { onSuccess: onClose };
  const offer = () => act.mutate(() => call(offerTimes, { params, body: { version: order.version, times } }), done);
  const agree = (time: string) =>
    act.mutate(() => call(agreeTime, { params, body: { version: order.version, time } }), done);
  return (
    <Sheet open title="Times for the collection" onClose={onClose}>
      <View style={{ gap: space[4] }}>
        <Form form={form} notice={notice} label="A time">
          <DateField name="day" label="Day" today={room.today} latest={null} earliest={room.today} />
          <TextField name="clock" label="Time" inputMode="numeric" />
          <Button small icon="plus" label="Add this time" onPress={() => void form.submitForm()} />
        </Form>
        <Rows label="Times">
          {times.map((time) => (
            <Row
              key={time}
              title={timeWords(time, room.today)}
              trailing={
                <Button
                  small
                  kind="text"
                  label="Agreed"
                  describe={`Agreed: ${timeWords(time, room.today)}`}
                  onPress={() => agree(time)}
                />
              }
              action={
                <IconButton
                  icon="close"
                  label={`Leave out ${timeWords(time, room.today)}`}
                  onPress={() => setTimes(times.filter((one) => one !== time))}
                />
              }
            />
          ))}
        </Rows>
        {act.error ? <Notice tone="look" alert words={act.error.message} /> : null}
        <Text size="small" tone="soft">
          The buyer picks one by the link. With Agreed it is settled at once, and a calendar entry goes out.
        </Text>
        <Button
          kind="primary"
          grow
          label="Offer these times"
          busy={act.isPending}
          disabledBecause={times.length === 0 ? 'Add a time first' : null}
          onPress={offer}
        />
      </View>
    </Sheet>
  );
}
