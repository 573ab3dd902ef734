import { useLocalSearchParams } from 'expo-router';
import { TreatmentForm } from '@/features/water/TreatmentForm';

export default function Treatment() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <TreatmentForm tankId={tank} />;
}
