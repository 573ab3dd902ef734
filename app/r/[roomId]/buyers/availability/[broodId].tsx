import { useLocalSearchParams } from 'expo-router';
import { OfferScreen } from '@/features/buyers/AvailabilityScreen';

export default function Offered() {
  const { broodId } = useLocalSearchParams<{ broodId: string }>();
  return <OfferScreen broodId={broodId} />;
}
