import { useLocalSearchParams } from 'expo-router';
import { ChangeStrainScreen } from '@/features/strains/StrainForm';

export default function ChangeStrain() {
  const { strainId } = useLocalSearchParams<{ strainId: string }>();
  return <ChangeStrainScreen strainId={strainId} />;
}
