import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { addTank, changeTank, listTanks, readTank } from '@/shared/tanks/contract';
import { listWater } from '@/shared/water/contract';

export const tanksQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'tanks'],
    queryFn: ({ signal }) => call(listTanks, { params: { roomId }, signal }),
  });

export const tankQuery = (roomId: string, tankId: string) =>
  queryOptions({
    queryKey: [roomId, 'tank', tankId],
    queryFn: ({ signal }) => call(readTank, { params: { roomId, tankId }, signal }),
  });

export type TankTold = z.output<typeof readTank.output>;

export const tankWaterQuery = (roomId: string, tankId: string) =>
  queryOptions({
    queryKey: [roomId, 'water', tankId],
    queryFn: ({ signal }) => call(listWater, { params: { roomId }, query: { tankId }, signal }),
  });

export function useAddTank() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof addTank.body>) => call(addTank, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useChangeTank(tankId: string) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeTank.body>) => call(changeTank, { params: { roomId, tankId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
