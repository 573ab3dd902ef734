import { ColoniesScreen } from '@/features/colonies/ColonyScreen';

export default function Colonies() {
  return <ColoniesScreen />;
}
