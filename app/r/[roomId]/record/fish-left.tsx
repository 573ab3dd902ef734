import { useLocalSearchParams } from 'expo-router';
import { FishLeftForm } from '@/features/fishEntries/FishLeftForm';

export default function FishLeft() {
  const { tank, fish } = useLocalSearchParams<{ tank?: string; fish?: string }>();
  return <FishLeftForm tankId={tank} fishId={fish} />;
}
