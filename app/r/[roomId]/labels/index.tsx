import { useLocalSearchParams } from 'expo-router';
import { LabelsScreen } from '@/features/labels/LabelsScreen';

export default function Labels() {
  const { tank, colony } = useLocalSearchParams<{ tank?: string; colony?: string }>();
  return <LabelsScreen tank={tank} colony={colony} />;
}
