import { useLocalSearchParams } from 'expo-router';
import { StockOfStrain } from '@/features/stock/StockOfStrain';
import { StrainScreen } from '@/features/strains/StrainScreen';

export default function Strain() {
  const { strainId } = useLocalSearchParams<{ strainId: string }>();
  return <StrainScreen strainId={strainId} stock={<StockOfStrain strainId={strainId} />} history={null} />;
}
