import { useQuery } from '@tanstack/react-query';
import { useLocalSearchParams } from 'expo-router';
import { pedigreeQuery } from '@/features/lineage/queries';
import { PlanScreen } from '@/features/plans/PlanScreen';
import { useRoom } from '@/hooks/useRoom';

export default function SavedPlan() {
  const { planId } = useLocalSearchParams<{ planId: string }>();
  const { id: roomId } = useRoom();
  const { data: nodes } = useQuery(pedigreeQuery(roomId));
  return <PlanScreen planId={planId} nodes={nodes} />;
}
