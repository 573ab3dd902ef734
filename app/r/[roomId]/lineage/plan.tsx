import { LineageFrame } from '@/features/lineage/LineageFrame';
import { inScope } from '@/features/lineage/scope';
import { PlanDesk } from '@/features/plans/PlanDesk';

export default function PairingPlan() {
  return (
    <LineageFrame tab="plan">
      {(nodes, scope) => <PlanDesk key={scope.value} nodes={nodes} of={inScope(nodes, scope)} />}
    </LineageFrame>
  );
}
