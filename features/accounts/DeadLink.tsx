import { Button } from '@/components/ui/Button';
import { DoorFrame } from './DoorFrame';

/** A link without its secret word: typed by hand, or opened a second time. */
export function DeadLink() {
  return (
    <DoorFrame title="This link is not whole" words="Open it from the letter again, or ask for a new one.">
      <Button kind="primary" label="To signing in" href="/sign-in" grow />
    </DoorFrame>
  );
}
