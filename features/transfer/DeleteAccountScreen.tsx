import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Screen } from '@/components/ui/Screen';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { useDeleteAccount } from './queries';

/** The way out: name, address and sign-ins go; what was recorded stays under "a former member". */
export function DeleteAccountScreen() {
  const room = useRoom();
  const [asking, setAsking] = useState(false);
  return (
    <Screen title="Delete your account" back={`/r/${room.id}/settings`} measure>
      <View style={{ gap: space[4], paddingTop: space[3] }}>
        <Text tone="soft">
          Your name, address and sign-ins are taken away at once and for good. What you recorded stays in its fishrooms,
          by “a former member”.
        </Text>
        <Button small label="Delete my account" onPress={() => setAsking(true)} />
        <Sheet open={asking} title="Delete your account?" onClose={() => setAsking(false)}>
          <PasswordForm />
        </Sheet>
      </View>
    </Screen>
  );
}

const PasswordDraft = z.strictObject({ current: z.optional(z.string()) });

function PasswordForm() {
  const remove = useDeleteAccount();
  const { form, notice } = useSchemaForm({
    schema: PasswordDraft,
    start: { current: '' },
    save: async ({ current }) => {
      await remove.mutateAsync(current || null);
      // Everything that this page knows belongs to somebody who is no longer here.
      window.location.assign('/');
    },
  });
  return (
    <Form form={form} notice={notice} label="Delete your account">
      <PasswordField
        name="current"
        label="Your password"
        purpose="current"
        hint="Leave it empty if you sign in by letter and have none."
      />
      <SubmitButton label="Delete my account" busyLabel="Deleting" />
    </Form>
  );
}
