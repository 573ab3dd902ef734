import { useLocalSearchParams } from 'expo-router';
import { CheckForm } from '@/features/holds/CheckForm';

export default function Check() {
  const { hold, tank } = useLocalSearchParams<{ hold?: string; tank?: string }>();
  return <CheckForm holdId={hold} tankId={tank} />;
}
