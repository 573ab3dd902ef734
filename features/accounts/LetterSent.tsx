import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { DoorFrame } from './DoorFrame';

type Props = { email: string; goodFor: string; again: () => void };

/** After a letter was asked for. Whether the address has an account is not said. */
export function LetterSent({ email, goodFor, again }: Props) {
  return (
    <DoorFrame
      title="Look at your mail"
      words={`If ${email} has an account, a letter with a link is on its way there.`}
    >
      <Text>The link works once, within {goodFor}. A later letter makes an earlier one void.</Text>
      <Button label="Another address" onPress={again} grow />
    </DoorFrame>
  );
}
