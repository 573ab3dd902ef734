import { useLocalSearchParams } from 'expo-router';
import { ParentageScreen } from '@/features/lineage/ParentageScreen';

export default function Parents() {
  const { animalId } = useLocalSearchParams<{ animalId: string }>();
  return <ParentageScreen key={animalId} animalId={animalId} />;
}
