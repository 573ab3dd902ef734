import { useState } from 'react';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { call } from '@/features/call';
import type { Me } from '@/shared/accounts/contract';
import { ChangePassword, changePassword } from '@/shared/accounts/security';
import { PASSWORD_MIN } from '@/shared/accounts/shapes';
import { useAskAgain } from './queries';

type Account = Me['account'];

export function PasswordPart({ account }: { account: Account }) {
  const [state, setState] = useState<'rest' | 'changing' | 'saved'>('rest');
  if (state === 'changing') return <PasswordForm account={account} onSaved={() => setState('saved')} />;
  return (
    <>
      {state === 'saved' ? <Notice alert words="Password saved. Every other device was signed out." /> : null}
      <Button
        small
        label={account.hasPassword ? 'Change the password' : 'Choose a password'}
        onPress={() => setState('changing')}
      />
    </>
  );
}

function PasswordForm({ account, onSaved }: { account: Account; onSaved: () => void }) {
  const askAgain = useAskAgain();
  const { form, notice } = useSchemaForm({
    schema: ChangePassword,
    start: { current: account.hasPassword ? '' : null, password: '' },
    save: async (body) => {
      await call(changePassword, { body });
      await askAgain();
      onSaved();
    },
  });
  return (
    <Form form={form} notice={notice} label="Password">
      {account.hasPassword ? <PasswordField name="current" label="Your password" purpose="current" /> : null}
      <PasswordField name="password" label="New password" purpose="new" hint={`${PASSWORD_MIN} letters or more.`} />
      <SubmitButton label="Save password" />
    </Form>
  );
}
