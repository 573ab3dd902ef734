import { LettersScreen } from '@/features/letters/LettersScreen';

export default function Letters() {
  return <LettersScreen />;
}
