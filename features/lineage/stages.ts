import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { broodStage } from '@/shared/broods/broodStage';
import { listBroods } from '@/shared/broods/contract';
import type { Stage } from '@/shared/broods/stage';

/** The stage of each brood today, to fill its diamond with. */
export function useStages(): ReadonlyMap<string, Stage> {
  const { id: roomId, today } = useRoom();
  const { data } = useQuery({
    queryKey: [roomId, 'lineage', 'broods'],
    queryFn: ({ signal }) => call(listBroods, { params: { roomId }, query: { which: 'all' }, signal }),
  });
  return useMemo(() => new Map(data?.broods.map((brood) => [brood.id, broodStage(brood, today)])), [data, today]);
}
