import { useMutation } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextLink } from '@/components/ui/TextLink';
import { call } from '@/features/call';
import { verifyEmail } from '@/shared/accounts/links';
import { DeadLink } from './DeadLink';
import { DoorFrame } from './DoorFrame';
import { useLinkToken } from './linkToken';
import { useAskAgain } from './queries';

/** Behind the link that confirms an address. Opening the page confirms nothing; the button does. */
export function VerifyScreen() {
  const token = useLinkToken();
  const askAgain = useAskAgain();
  const confirm = useMutation({ mutationFn: () => call(verifyEmail, { body: { token } }), onSuccess: askAgain });
  if (token === '') return <DeadLink />;
  if (confirm.data) {
    return (
      <DoorFrame title="Address confirmed" words={confirm.data.email}>
        <Button kind="primary" label="Go on" href="/" grow />
      </DoorFrame>
    );
  }
  return (
    <DoorFrame title="Confirm your address" words="It is where links to sign in and news of your fishrooms go.">
      {confirm.error ? <Notice tone="act" alert words={confirm.error.message} /> : null}
      <Button
        kind="primary"
        label="Confirm the address"
        busyLabel="Confirming"
        busy={confirm.isPending}
        onPress={() => confirm.mutate()}
        grow
      />
      <TextLink label="Back to Kinwater" href="/" />
    </DoorFrame>
  );
}
