import { ContradictionsScreen } from '@/features/lineage/ContradictionsScreen';

export default function Contradictions() {
  return <ContradictionsScreen />;
}
