import { Slot, useLocalSearchParams } from 'expo-router';
import { RoomShell } from '@/features/accounts/RoomShell';
import { QueueKeeper } from '@/features/queue/QueueKeeper';
import { WaitingPanel } from '@/features/queue/WaitingPanel';
import { RecordSheet } from '@/features/record/RecordSheet';
import { OpenedKeeper } from '@/features/search/OpenedKeeper';

export default function RoomLayout() {
  const { roomId } = useLocalSearchParams<{ roomId: string }>();
  return (
    <RoomShell
      roomId={roomId}
      recordSheet={(open, close) => <RecordSheet open={open} onClose={close} />}
      waiting={<WaitingPanel />}
    >
      <QueueKeeper />
      <OpenedKeeper />
      <Slot />
    </RoomShell>
  );
}
