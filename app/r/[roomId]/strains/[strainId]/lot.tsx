import { useLocalSearchParams } from 'expo-router';
import { LotForm } from '@/features/strains/LotForm';

export default function NewLot() {
  const { strainId } = useLocalSearchParams<{ strainId: string }>();
  return <LotForm strainId={strainId} />;
}
