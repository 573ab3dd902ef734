import { useState } from 'react';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { TextLink } from '@/components/ui/TextLink';
import { call } from '@/features/call';
import { AskForLetter, askPasswordReset } from '@/shared/accounts/links';
import { DoorFrame } from './DoorFrame';
import { LetterSent } from './LetterSent';

/** Asks for the letter that sets a new password. */
export function ForgotScreen() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { form, notice } = useSchemaForm({
    schema: AskForLetter,
    start: { email: '' },
    save: async (body) => {
      await call(askPasswordReset, { body });
      setSentTo(body.email);
    },
  });
  if (sentTo !== null) return <LetterSent email={sentTo} goodFor="an hour" again={() => setSentTo(null)} />;
  return (
    <DoorFrame title="Forgotten password" words="A letter comes with a link, and behind it you choose a new one.">
      <Form form={form} notice={notice} label="Forgotten password">
        <TextField name="email" label="Email" needed inputMode="email" autoComplete="email" autoCapitalize="none" />
        <SubmitButton label="Email me the link" busyLabel="Asking for the link" />
      </Form>
      <TextLink label="Back to signing in" href="/sign-in" />
    </DoorFrame>
  );
}
