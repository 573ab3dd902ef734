import { StockScreen } from '@/features/stock/StockScreen';

export default function Stock() {
  return <StockScreen />;
}
