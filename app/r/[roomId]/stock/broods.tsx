import { BroodsScreen } from '@/features/broods/BroodScreen';

export default function Broods() {
  return <BroodsScreen />;
}
