import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { OwnOrder } from '@/shared/orders/own';
import { line } from '@/shared/shapes';
import { useCancelOwn } from './ownQueries';

const Draft = z.strictObject({ because: line(300, 'Say why') });

/** Before anything was paid it is off at once. */
export function OwnCancel({ token, order }: { token: string; order: OwnOrder }) {
  const [open, setOpen] = useState(false);
  const cancel = useCancelOwn(token);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { because: '' },
    save: ({ because }) => cancel.mutateAsync(because),
  });
  if (!open) return <Button kind="text" label="Cancel this order" onPress={() => setOpen(true)} />;
  return (
    <Section title="Cancel this order">
      <Form form={form} notice={notice} label="Cancel this order">
        <View style={{ gap: space[3] }}>
          {order.receivedCents > 0 ? (
            <Text tone="soft">What you paid is given back by the fishroom within its terms.</Text>
          ) : null}
          <TextField name="because" label="Why?" />
          <SubmitButton label="Cancel the order" />
          <Button kind="text" label="Keep it" onPress={() => setOpen(false)} />
        </View>
      </Form>
    </Section>
  );
}
