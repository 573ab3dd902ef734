import { Slot, useLocalSearchParams } from 'expo-router';
import { RoomShell } from '@/features/accounts/RoomShell';
import { RecordSheet } from '@/features/record/RecordSheet';

export default function RoomLayout() {
  const { roomId } = useLocalSearchParams<{ roomId: string }>();
  return (
    <RoomShell roomId={roomId} recordSheet={(open, close) => <RecordSheet open={open} onClose={close} />}>
      <Slot />
    </RoomShell>
  );
}
