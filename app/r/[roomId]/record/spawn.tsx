import { useLocalSearchParams } from 'expo-router';
import { HoldingForm } from '@/features/holds/HoldingForm';

export default function Spawn() {
  const { tank, colony } = useLocalSearchParams<{ tank?: string; colony?: string }>();
  return <HoldingForm seen="spawn" tankId={tank} colonyId={colony} />;
}
