import { useState } from 'react';
import { useThemeChoice } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { sendWaiting } from '@/features/entries';
import { useMe, useSignOut } from './queries';

/** The gate above shows the door once nobody is signed in. What waits on this device is sent first, or asked about. */
export function SignOutButton() {
  const { name, choose } = useThemeChoice();
  const { account } = useMe();
  const signOut = useSignOut();
  const [left, setLeft] = useState(0);
  const [sending, setSending] = useState(false);
  const leave = async () => {
    await signOut.mutateAsync();
    // Signing out clears this device's storage; the theme is the device's own and stays.
    choose(name);
  };
  const sendFirst = async () => {
    setSending(true);
    const unsent = await sendWaiting(account.id).finally(() => setSending(false));
    setLeft(unsent);
    if (unsent === 0) await leave();
  };
  const records = left === 1 ? 'record' : 'records';
  return (
    <>
      {signOut.error ? <Notice tone="act" alert words={signOut.error.message} /> : null}
      {left > 0 ? (
        <Notice
          tone="act"
          alert
          title={`${left} ${records} here ${left === 1 ? 'has' : 'have'} not been sent`}
          words="Signing out takes them off this device. Stay signed in, and they go up by themselves when the signal is back."
        >
          <Button label="Stay signed in" small onPress={() => setLeft(0)} />
          <Button label={`Throw away ${left} ${records}, sign out`} small onPress={() => void leave()} />
        </Notice>
      ) : null}
      <Button
        label="Sign out"
        busy={sending || signOut.isPending}
        busyLabel={sending ? 'Sending what waits' : 'Signing out'}
        onPress={() => void sendFirst()}
      />
    </>
  );
}
