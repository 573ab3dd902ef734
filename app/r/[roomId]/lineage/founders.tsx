import { FoundersScreen } from '@/features/lineage/FoundersScreen';

export default function Founders() {
  return <FoundersScreen />;
}
