import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import type { Me } from '@/shared/accounts/contract';
import { askVerifyLetter } from '@/shared/accounts/links';
import { ChangeEmail, changeEmail } from '@/shared/accounts/security';

type Account = Me['account'];

/** The address, whether it is confirmed, and how to change it. */
export function EmailPart({ account }: { account: Account }) {
  const [changing, setChanging] = useState(false);
  const [sentTo, setSentTo] = useState<string | null>(null);
  return (
    <>
      <Text style={{ marginBottom: space[3] }}>{account.email}</Text>
      {account.emailVerified ? null : <NotConfirmed />}
      {sentTo ? (
        <Notice alert words={`A letter is on its way to ${sentTo}. The address changes when its link is used.`} />
      ) : null}
      {changing ? (
        <ChangeEmailForm
          account={account}
          onSent={(email) => {
            setSentTo(email);
            setChanging(false);
          }}
        />
      ) : (
        <Button label="Change the address" small onPress={() => setChanging(true)} />
      )}
    </>
  );
}

function NotConfirmed() {
  const letter = useMutation({ mutationFn: () => call(askVerifyLetter) });
  if (letter.isSuccess) return <Notice alert words="Another letter is on its way. Its link is good for a day." />;
  return (
    <Notice
      tone={letter.error ? 'act' : 'look'}
      words={
        letter.error?.message ?? 'Use the link in the letter that was sent there. Until then you cannot invite others.'
      }
    >
      <Button
        small
        label="Send the letter again"
        busy={letter.isPending}
        busyLabel="Sending"
        onPress={() => letter.mutate()}
      />
    </Notice>
  );
}

function ChangeEmailForm({ account, onSent }: { account: Account; onSent: (email: string) => void }) {
  const { form, notice } = useSchemaForm({
    schema: ChangeEmail,
    start: { email: '', current: account.hasPassword ? '' : null },
    save: async (body) => {
      await call(changeEmail, { body });
      onSent(body.email);
    },
  });
  return (
    <Form form={form} notice={notice} label="Change the address">
      <TextField name="email" label="New email" needed inputMode="email" autoComplete="email" autoCapitalize="none" />
      {account.hasPassword ? <PasswordField name="current" label="Your password" purpose="current" /> : null}
      <SubmitButton label="Send a letter to the new address" busyLabel="Sending" />
    </Form>
  );
}
