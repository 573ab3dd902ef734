import { useLocalSearchParams } from 'expo-router';
import { LeftForm } from '@/features/broods/LeftForm';

export default function Left() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <LeftForm tank={tank} brood={brood} batch={batch} />;
}
