import { useLocalSearchParams } from 'expo-router';
import { LostForm } from '@/features/holds/LostForm';

export default function Swallowed() {
  const { hold, tank } = useLocalSearchParams<{ hold?: string; tank?: string }>();
  return <LostForm holdId={hold} tankId={tank} />;
}
