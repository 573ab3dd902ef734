import { useQuery } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { type FishRow, listFish, proposeFishCodes } from '@/shared/fish/contract';
import { readToday } from '@/shared/today/contract';

/** The living fish of the fishroom. */
export function useFish() {
  const { id: roomId } = useRoom();
  return useQuery({
    queryKey: [roomId, 'record', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params: { roomId }, signal }),
    select: ({ fish }): FishRow[] => fish.filter(({ exit }) => exit === null),
  });
}

/** The next free code after a colony's, or a strain's. */
export function useFreeCode(stem: string | null) {
  const { id: roomId } = useRoom();
  return useQuery({
    queryKey: [roomId, 'record', 'fish code', stem],
    queryFn: ({ signal }) =>
      call(proposeFishCodes, { params: { roomId }, query: { stem: stem ?? '', count: '1' }, signal }),
    select: ({ codes }) => codes[0] ?? '',
    enabled: stem !== null,
  });
}

/** What is known of the room today: the species as they are judged, batches with their last lengths. */
export function useTodayFacts() {
  const { id: roomId } = useRoom();
  return useQuery({
    queryKey: [roomId, 'today'],
    queryFn: ({ signal }) => call(readToday, { params: { roomId }, signal }),
  });
}
