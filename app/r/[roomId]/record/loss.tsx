import { useLocalSearchParams } from 'expo-router';
import { LossForm } from '@/features/broods/LossForm';

export default function Loss() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <LossForm tank={tank} brood={brood} batch={batch} />;
}
