import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { decideTask, readIntervals, readToday } from '@/shared/today/contract';

export const todayQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'today'],
    queryFn: ({ signal }) => call(readToday, { params: { roomId }, signal }),
  });

export const intervalsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'intervals'],
    queryFn: ({ signal }) => call(readIntervals, { params: { roomId }, signal }),
  });

/** Done, skipped, put off or given to someone. */
export function useDecideTask() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ taskKey, ...body }: { taskKey: string } & z.input<typeof decideTask.body>) =>
      call(decideTask, { params: { roomId, taskKey }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
