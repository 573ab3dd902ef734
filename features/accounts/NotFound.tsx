import { Button } from '@/components/ui/Button';
import { DoorFrame } from './DoorFrame';

/** An address that leads nowhere. */
export function NotFound() {
  return (
    <DoorFrame title="Nothing at this address" words="It is mistyped, or what was here has moved.">
      <Button kind="primary" label="To the fishroom" href="/" grow />
    </DoorFrame>
  );
}
