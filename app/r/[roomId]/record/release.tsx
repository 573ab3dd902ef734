import { useLocalSearchParams } from 'expo-router';
import { EndForm } from '@/features/holds/EndForm';

export default function Release() {
  const { hold, tank } = useLocalSearchParams<{ hold?: string; tank?: string }>();
  return <EndForm outcome="released" holdId={hold} tankId={tank} />;
}
