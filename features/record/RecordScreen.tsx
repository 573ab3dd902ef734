import { useRouter } from 'expo-router';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Screen } from '@/components/ui/Screen';
import { TankLine } from '@/features/entries/TankLine';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import { RecordActions } from './RecordActions';
import { useHere } from './useHere';

/** Record as a page of its own: where a scanned label leads, with its tank. */
export function RecordScreen() {
  const room = useRoom();
  const router = useRouter();
  const leave = useLeave();
  const here = useHere();
  const close = { label: 'Close Record', onPress: () => leave() };
  if (!may(room.role, 'entry:record')) {
    return (
      <Screen title="Record" close={close} measure>
        <EmptyState small title="You can read here" words="Ask the owner to make you a helper or keeper to record." />
      </Screen>
    );
  }
  return (
    <Screen
      title="Record"
      close={close}
      dock={<Button kind="primary" icon="scan" grow label="Scan a tank label" href={`/r/${room.id}/record/scan`} />}
      low
      measure
    >
      <TankLine tank={here.tank} onChange={(tank) => router.setParams({ tank })} />
      <RecordActions here={here} onGone={() => {}} replaces />
    </Screen>
  );
}
