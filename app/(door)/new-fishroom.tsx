import { SignedInOnly } from '@/features/accounts/gates';
import { NewRoomScreen } from '@/features/settings/NewRoomScreen';

export default function NewRoomPage() {
  return (
    <SignedInOnly>
      <NewRoomScreen />
    </SignedInOnly>
  );
}
