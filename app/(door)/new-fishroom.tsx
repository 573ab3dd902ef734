import { DoorFrame } from '@/features/accounts/DoorFrame';
import { SignedInOnly } from '@/features/accounts/gates';
import { NewRoomForm } from '@/features/settings/NewRoomForm';

export default function NewRoomPage() {
  return (
    <SignedInOnly>
      <DoorFrame title="Start a fishroom" words="All of it can be changed later.">
        <NewRoomForm />
      </DoorFrame>
    </SignedInOnly>
  );
}
