import { useState } from 'react';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { PasswordField } from '@/components/form/PasswordField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import type { Me } from '@/shared/accounts/contract';
import { ProvePassword, startSecondStep, turnOnSecondStep } from '@/shared/accounts/security';
import { CodeForm } from './CodeForm';
import { SquareCode } from './SquareCode';

type Account = Me['account'];
type Secret = z.output<typeof startSecondStep.output>;
type Props = { account: Account; onDone: (recoveryCodes: string[]) => Promise<void> };

/** Password, then the secret for the authenticator, then a first code of it. */
export function SetUpSecondStep({ account, onDone }: Props) {
  const [secret, setSecret] = useState<Secret | null>(null);
  const { form, notice } = useSchemaForm({
    schema: ProvePassword,
    start: { current: account.hasPassword ? '' : null },
    save: async (body) => setSecret(await call(startSecondStep, { body })),
  });
  if (secret) return <FirstCode secret={secret} onDone={onDone} />;
  return (
    <Form form={form} notice={notice} label="Set up the second step">
      {account.hasPassword ? <PasswordField name="current" label="Your password" purpose="current" /> : null}
      <SubmitButton label="Go on" busyLabel="Checking" />
    </Form>
  );
}

function FirstCode({ secret, onDone }: { secret: Secret; onDone: Props['onDone'] }) {
  return (
    <View style={{ gap: space[4] }}>
      <Text>Scan this with your authenticator, then type the code that it shows.</Text>
      <SquareCode square={secret.square} label="Square code for the authenticator" />
      <Text size="small" tone="soft">
        On this very phone, type the key instead: <Code>{secret.secret.replace(/(.{4})(?=.)/g, '$1 ')}</Code>
      </Text>
      <CodeForm
        label="Turn on the second step"
        save={async (body) => onDone((await call(turnOnSecondStep, { body })).recoveryCodes)}
      />
    </View>
  );
}
