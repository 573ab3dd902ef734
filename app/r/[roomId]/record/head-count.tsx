import { useLocalSearchParams } from 'expo-router';
import { HeadCountForm } from '@/features/broods/HeadCountForm';

export default function HeadCount() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <HeadCountForm tank={tank} brood={brood} batch={batch} />;
}
