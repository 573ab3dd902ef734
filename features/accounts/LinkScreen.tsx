import { useMutation } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextLink } from '@/components/ui/TextLink';
import { DeadLink } from './DeadLink';
import { DoorFrame } from './DoorFrame';
import { useDoor } from './door';
import { useLinkToken } from './linkToken';
import { SecondStepScreen } from './SecondStepScreen';

/** Behind a sign-in link. Opening the page uses nothing up; the button does. */
export function LinkScreen() {
  const token = useLinkToken();
  const door = useDoor(undefined);
  const enter = useMutation({ mutationFn: () => door.byLink(token) });
  if (token === '') return <DeadLink />;
  if (enter.data) return <SecondStepScreen next={undefined} />;
  return (
    <DoorFrame title="Sign in on this device" words="The link works once.">
      {enter.error ? <Notice tone="act" alert words={enter.error.message} /> : null}
      <Button
        kind="primary"
        label="Sign in"
        busyLabel="Signing in"
        busy={enter.isPending}
        onPress={() => enter.mutate()}
        grow
      />
      <TextLink label="Ask for another link" href="/sign-in" />
    </DoorFrame>
  );
}
