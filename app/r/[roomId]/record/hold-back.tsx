import { useLocalSearchParams } from 'expo-router';
import { HoldBackForm } from '@/features/broods/HoldBackForm';

export default function HoldBack() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <HoldBackForm tank={tank} brood={brood} batch={batch} />;
}
