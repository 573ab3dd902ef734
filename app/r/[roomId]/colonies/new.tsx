import { useLocalSearchParams } from 'expo-router';
import { NewColonyScreen } from '@/features/colonies/NewColonyScreen';

export default function NewColony() {
  const { strain } = useLocalSearchParams<{ strain?: string }>();
  return <NewColonyScreen strainId={strain} />;
}
