import { useLocalSearchParams } from 'expo-router';
import { JoinForm } from '@/features/broods/JoinForm';

export default function Join() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <JoinForm tank={tank} brood={brood} batch={batch} />;
}
