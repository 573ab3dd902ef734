import { useQuery } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { listFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import type { Waiting } from './waiting';

/** What things are called, out of what this device has seen, and of what waits here. */
export function useCodes(entries: readonly Waiting[]): (id: string) => string | null {
  const { id: roomId } = useRoom();
  const { data: tanks = [] } = useTanks();
  const fish = useQuery({
    queryKey: [roomId, 'record', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params: { roomId }, signal }),
  });
  const holds = useQuery({
    queryKey: [roomId, 'holds', 'open'],
    queryFn: ({ signal }) => call(listHolds, { params: { roomId }, query: { which: 'open' }, signal }),
  });
  const codes = new Map<string, string>();
  for (const { id, code } of fish.data?.fish ?? []) if (code) codes.set(id, code);
  for (const { id, code, residents } of tanks) {
    codes.set(id, code);
    for (const resident of residents) if (resident.code) codes.set(resident.id, resident.code);
  }
  for (const { id, holder, tank } of holds.data?.holds ?? []) codes.set(id, holder?.code ?? tank.code);
  for (const { content } of entries) nameMade(codes, content);
  return (id) => codes.get(id) ?? null;
}

function nameMade(codes: Map<string, string>, content: Waiting['content']): void {
  if (content.kind === 'holdingSeen' || content.kind === 'spawnSeen') {
    const code = codes.get(content.holderId ?? content.tankId);
    if (code) codes.set(content.holdId, code);
  }
  if (content.kind === 'holdEnded' && content.brood) {
    codes.set(content.brood.broodId, content.brood.code);
    codes.set(content.brood.batchId, content.brood.code);
  }
  if (content.kind === 'broodFound') {
    codes.set(content.broodId, content.code);
    codes.set(content.batchId, content.code);
  }
}
