import { useThemeChoice } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { useSignOut } from './queries';

/** The gate above shows the door once nobody is signed in. */
export function SignOutButton() {
  const { name, choose } = useThemeChoice();
  const signOut = useSignOut();
  const leave = async () => {
    await signOut.mutateAsync();
    // Signing out clears this device's storage; the theme is the device's own and stays.
    choose(name);
  };
  return (
    <>
      {signOut.error ? <Notice tone="act" alert words={signOut.error.message} /> : null}
      <Button label="Sign out" busy={signOut.isPending} busyLabel="Signing out" onPress={() => void leave()} />
    </>
  );
}
