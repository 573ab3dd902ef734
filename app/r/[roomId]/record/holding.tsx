import { useLocalSearchParams } from 'expo-router';
import { HoldingForm } from '@/features/holds/HoldingForm';

export default function Holding() {
  const { tank, colony } = useLocalSearchParams<{ tank?: string; colony?: string }>();
  return <HoldingForm seen="holding" tankId={tank} colonyId={colony} />;
}
