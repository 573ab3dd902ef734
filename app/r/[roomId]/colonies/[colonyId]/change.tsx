import { useLocalSearchParams } from 'expo-router';
import { ChangeColonyScreen } from '@/features/colonies/ChangeColonyScreen';

export default function ChangeColony() {
  const { colonyId } = useLocalSearchParams<{ colonyId: string }>();
  return <ChangeColonyScreen colonyId={colonyId} />;
}
