import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo } from 'react';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { broodStage } from '@/shared/broods/broodStage';
import { listBroods } from '@/shared/broods/contract';
import type { Stage } from '@/shared/broods/stage';

/** The stage of each brood today, to fill its diamond with. */
export function useStages(): (id: string) => Stage | undefined {
  const { id: roomId, today } = useRoom();
  const { data } = useQuery({
    queryKey: [roomId, 'lineage', 'broods'],
    queryFn: ({ signal }) => call(listBroods, { params: { roomId }, query: { which: 'all' }, signal }),
  });
  const stages = useMemo(
    () => new Map(data?.broods.map((brood) => [brood.id, broodStage(brood, today)])),
    [data, today],
  );
  return useCallback((id) => stages.get(id), [stages]);
}
