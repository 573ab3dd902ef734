import { useRouter } from 'expo-router';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { useRoom } from '@/hooks/useRoom';
import { useMemberChanges } from './queries';

/** Leaving the fishroom, asked twice; the last owner is told why not. */
export function LeaveButton() {
  const room = useRoom();
  const router = useRouter();
  const [asking, setAsking] = useState(false);
  const { leave } = useMemberChanges();
  if (!asking) return <Button kind="text" small label={`Leave ${room.name}`} onPress={() => setAsking(true)} />;
  return (
    <Notice
      tone={leave.error ? 'act' : 'look'}
      alert
      title={`Leave ${room.name}?`}
      words={leave.error?.message ?? 'You come back only by another invitation. What you recorded stays.'}
    >
      <Button
        small
        label="Leave"
        busy={leave.isPending}
        busyLabel="Leaving"
        onPress={() => leave.mutate(undefined, { onSuccess: () => router.replace('/') })}
      />
      <Button small kind="text" label="Stay" onPress={() => setAsking(false)} />
    </Notice>
  );
}
