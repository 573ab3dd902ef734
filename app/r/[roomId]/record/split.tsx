import { useLocalSearchParams } from 'expo-router';
import { SplitForm } from '@/features/broods/SplitForm';

export default function Split() {
  const { tank, brood, batch } = useLocalSearchParams<{ tank?: string; brood?: string; batch?: string }>();
  return <SplitForm tank={tank} brood={brood} batch={batch} />;
}
