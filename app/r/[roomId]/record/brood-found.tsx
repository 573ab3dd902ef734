import { useLocalSearchParams } from 'expo-router';
import { BroodFoundForm } from '@/features/broods/BroodFoundForm';

export default function BroodFound() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <BroodFoundForm tank={tank} />;
}
