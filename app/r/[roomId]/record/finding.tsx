import { useLocalSearchParams } from 'expo-router';
import { FindingForm } from '@/features/fishEntries/FindingForm';

export default function Finding() {
  const { tank, fish } = useLocalSearchParams<{ tank?: string; fish?: string }>();
  return <FindingForm tankId={tank} fishId={fish} />;
}
