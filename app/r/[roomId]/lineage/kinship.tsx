import { KinshipScreen } from '@/features/lineage/KinshipScreen';

export default function Kinship() {
  return <KinshipScreen />;
}
