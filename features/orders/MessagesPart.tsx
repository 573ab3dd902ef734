import { useEffect, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { MessageDraft, markRead, type OrderPage, sendMessage } from '@/shared/orders/contract';
import { useAct } from './queries';

type Messages = NonNullable<OrderPage['owner']>['messages'];

const Draft = z.strictObject({ body: MessageDraft.shape.body });

/** The thread with the buyer; what is written here goes out as a letter. */
export function MessagesPart({ told, messages }: { told: OrderPage; messages: Messages }) {
  const { id: roomId } = useRoom();
  const { mutate } = useAct();
  const { id: orderId, unread } = told.order;
  const isUnread = (unread ?? 0) > 0;
  // Opening the thread is reading it: the server has to be told.
  useEffect(() => {
    if (isUnread) mutate(() => call(markRead, { params: { roomId, orderId }, body: {} }));
  }, [isUnread, mutate, roomId, orderId]);
  return (
    <Section title="Messages" aside={messages.length > 0 ? String(messages.length) : undefined}>
      {messages.map((message) => (
        <MessageLine key={message.id} {...message} />
      ))}
      <Answer key={messages.length} orderId={orderId} />
    </Section>
  );
}

function MessageLine({ fromBuyer, by, body, at }: Messages[number]) {
  const theme = useTheme();
  const room = useRoom();
  return (
    <View
      style={[styles.message, { borderBottomColor: theme.rule, borderLeftColor: fromBuyer ? theme.ink : theme.rule }]}
    >
      <Text size="small" tone="soft">
        {`${fromBuyer ? 'Buyer' : (by ?? 'You')}, ${formatDay(at.slice(0, 10), room.today)}`}
      </Text>
      <Text>{body}</Text>
    </View>
  );
}

function Answer({ orderId }: { orderId: string }) {
  const { id: roomId } = useRoom();
  const [id] = useState(newId);
  const act = useAct();
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { body: '' },
    save: ({ body }) => act.mutateAsync(() => call(sendMessage, { params: { roomId, orderId }, body: { id, body } })),
  });
  return (
    <View style={styles.answer}>
      <Form form={form} notice={notice} label="Message to the buyer">
        <TextField name="body" label="Write to the buyer" long />
        <SubmitButton kind="plain" label="Send message" />
      </Form>
    </View>
  );
}

const styles = StyleSheet.create({
  message: {
    paddingVertical: space[2],
    paddingLeft: space[3],
    borderBottomWidth: line.row,
    borderLeftWidth: 3,
    gap: 2,
  },
  answer: { marginTop: space[3] },
});
