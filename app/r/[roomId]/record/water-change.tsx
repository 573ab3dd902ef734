import { useLocalSearchParams } from 'expo-router';
import { ChangeForm } from '@/features/water/ChangeForm';

export default function WaterChange() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <ChangeForm tankId={tank} />;
}
