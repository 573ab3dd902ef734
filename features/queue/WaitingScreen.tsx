import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useQueue } from '@/features/entries';
import { useOnline } from '@/hooks/useOnline';
import { useRoom } from '@/hooks/useRoom';
import { queue } from './queue';
import { WaitingList } from './WaitingList';

/** Everything that waits on this device, on a page of its own. */
export function WaitingScreen() {
  const room = useRoom();
  const { entries, sendingId, noSignal } = useQueue();
  const online = useOnline();
  return (
    <Screen title="Waiting records" back={`/r/${room.id}`} measure>
      {entries.length === 0 ? (
        <EmptyState
          title="Nothing waits here"
          words="What you record is sent at once. Without a signal it waits on this device, and goes up by itself."
        />
      ) : (
        <>
          <WaitingWords />
          <WaitingList />
          {online ? (
            <Button
              label="Try to send now"
              busy={sendingId !== null}
              busyLabel="Sending"
              onPress={() => void queue.drain()}
            />
          ) : null}
          {online && noSignal ? (
            <Text size="small" tone="soft">
              The last try did not reach the server. It is tried again by itself.
            </Text>
          ) : null}
        </>
      )}
    </Screen>
  );
}

/** What becomes of them, in a line. */
export function WaitingWords() {
  const { entries, signedOut } = useQueue();
  const refused = entries.filter(({ trouble }) => trouble !== null).length;
  if (signedOut)
    return (
      <Notice tone="look" words="You were signed out. They are kept here for you: sign in again and they go up." />
    );
  if (refused > 0)
    return (
      <Notice
        tone="look"
        title={`${refused} ${refused === 1 ? 'record was' : 'records were'} not saved`}
        words="Look at each below. What builds on it waits with it; everything else goes up."
      />
    );
  return (
    <Text tone="soft">
      Safe on this device. They go up by themselves when the signal is back, in the order of making.
    </Text>
  );
}
