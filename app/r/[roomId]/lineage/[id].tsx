import { useLocalSearchParams } from 'expo-router';
import { LineageOfScreen } from '@/features/lineage/LineageOfScreen';

export default function LineageOf() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return <LineageOfScreen id={id} />;
}
