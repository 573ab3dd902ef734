import { useLocalSearchParams } from 'expo-router';
import { TestForm } from '@/features/water/TestForm';

export default function WaterTest() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <TestForm tankId={tank} />;
}
