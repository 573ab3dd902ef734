import { useLocalSearchParams } from 'expo-router';
import { EndForm } from '@/features/holds/EndForm';

export default function Strip() {
  const { hold, tank } = useLocalSearchParams<{ hold?: string; tank?: string }>();
  return <EndForm outcome="stripped" holdId={hold} tankId={tank} />;
}
