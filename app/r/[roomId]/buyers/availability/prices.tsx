import { PriceListScreen } from '@/features/buyers/PriceListScreen';

export default function PriceList() {
  return <PriceListScreen />;
}
