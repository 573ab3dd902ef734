import { useLocalSearchParams } from 'expo-router';
import { SeenWellForm } from '@/features/water/SeenWellForm';

export default function SeenWell() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <SeenWellForm tankId={tank} />;
}
