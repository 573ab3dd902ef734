import { useLocalSearchParams } from 'expo-router';
import { StageCountForm } from '@/features/broods/StageCountForm';

export default function StageCount() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <StageCountForm tank={tank} brood={brood} batch={batch} />;
}
