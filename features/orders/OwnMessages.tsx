import { useState } from 'react';
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
import { newId } from '@/features/entries';
import { formatDay } from '@/shared/days';
import { MessageDraft } from '@/shared/orders/contract';
import type { OwnOrder } from '@/shared/orders/own';
import { useWrite } from './ownQueries';

const Draft = z.strictObject({ body: MessageDraft.shape.body });

type Props = { token: string; order: OwnOrder };

/** The thread with the fishroom. */
export function OwnMessages({ token, order }: Props) {
  const theme = useTheme();
  const { messages, today, room } = order;
  return (
    <Section title="Messages" aside={messages.length > 0 ? String(messages.length) : undefined}>
      {messages.map(({ id, fromBuyer, body, at }) => (
        <View
          key={id}
          style={[
            styles.message,
            { borderBottomColor: theme.rule, borderLeftColor: fromBuyer ? theme.rule : theme.ink },
          ]}
        >
          <Text size="small" tone="soft">
            {`${fromBuyer ? 'You' : room.name}, ${formatDay(at.slice(0, 10), today)}`}
          </Text>
          <Text>{body}</Text>
        </View>
      ))}
      <Write key={messages.length} token={token} order={order} />
    </Section>
  );
}

function Write({ token, order }: Props) {
  const [id] = useState(newId);
  const write = useWrite(token);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { body: '' },
    save: ({ body }) => write.mutateAsync({ id, body }),
  });
  return (
    <View style={styles.answer}>
      <Form form={form} notice={notice} label={`Message to ${order.room.name}`}>
        <TextField name="body" label={`Write to ${order.room.name}`} long />
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
