import { FishesScreen } from '@/features/fish/FishScreen';

export default function Fishes() {
  return <FishesScreen />;
}
