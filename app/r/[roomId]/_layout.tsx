import { Slot, useLocalSearchParams } from 'expo-router';
import { RoomShell } from '@/features/accounts/RoomShell';

export default function RoomLayout() {
  const { roomId } = useLocalSearchParams<{ roomId: string }>();
  return (
    <RoomShell roomId={roomId}>
      <Slot />
    </RoomShell>
  );
}
