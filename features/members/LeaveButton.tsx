import { useRouter } from 'expo-router';
import { useState } from 'react';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { useMemberChanges } from './queries';

/** Leaving the fishroom, asked twice; the last owner is told why not. */
export function LeaveButton() {
  const room = useRoom();
  const router = useRouter();
  const [asking, setAsking] = useState(false);
  const { leave } = useMemberChanges();
  const close = () => setAsking(false);
  return (
    <>
      <Button kind="text" small label={`Leave ${room.name}`} onPress={() => setAsking(true)} />
      <Sheet open={asking} title={`Leave ${room.name}?`} onClose={close}>
        {leave.error ? <Notice tone="act" alert words={leave.error.message} /> : null}
        <Text tone="soft" style={{ marginBottom: space[5] }}>
          You come back only by another invitation. What you recorded stays.
        </Text>
        <Button
          kind="primary"
          label="Leave"
          grow
          busy={leave.isPending}
          busyLabel="Leaving"
          onPress={() => leave.mutate(undefined, { onSuccess: () => router.replace('/') })}
        />
        <Button kind="text" small label="Stay" onPress={close} />
      </Sheet>
    </>
  );
}
