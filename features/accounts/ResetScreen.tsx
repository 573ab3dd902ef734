import { useState } from 'react';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Button } from '@/components/ui/Button';
import { call } from '@/features/call';
import { ResetPassword, resetPassword } from '@/shared/accounts/links';
import { PASSWORD_MIN } from '@/shared/accounts/shapes';
import { DeadLink } from './DeadLink';
import { DoorFrame } from './DoorFrame';
import { useLinkToken } from './linkToken';

/** Behind the link of a letter: the new password. */
export function ResetScreen() {
  const token = useLinkToken();
  const [done, setDone] = useState(false);
  const { form, notice } = useSchemaForm({
    schema: ResetPassword,
    start: { token, password: '' },
    save: async (body) => {
      await call(resetPassword, { body });
      setDone(true);
    },
  });
  if (token === '') return <DeadLink />;
  if (done) {
    return (
      <DoorFrame title="Password saved" words="Every device was signed out. Sign in with the new password.">
        <Button kind="primary" label="Sign in" href="/sign-in" grow />
      </DoorFrame>
    );
  }
  return (
    <DoorFrame title="Choose a password" words="Every device that is signed in now will be signed out.">
      <Form form={form} notice={notice} label="New password">
        <PasswordField name="password" label="New password" purpose="new" hint={`${PASSWORD_MIN} letters or more.`} />
        <SubmitButton label="Save password" />
      </Form>
    </DoorFrame>
  );
}
