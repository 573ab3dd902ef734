import { useLocalSearchParams } from 'expo-router';
import { DominantForm } from '@/features/fishEntries/DominantForm';

export default function Dominant() {
  const { tank, fish } = useLocalSearchParams<{ tank?: string; fish?: string }>();
  return <DominantForm tankId={tank} fishId={fish} />;
}
