import { LineageGraphScreen } from '@/features/lineage/GraphScreen';

export default function Lineage() {
  return <LineageGraphScreen />;
}
