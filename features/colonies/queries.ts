import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listBroods } from '@/shared/broods/contract';
import { addColony, changeColony, listColonies, readColony } from '@/shared/colonies/contract';
import { listFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import { listStrains } from '@/shared/strains/contract';

export const coloniesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'colonies'],
    queryFn: ({ signal }) => call(listColonies, { params: { roomId }, signal }),
    select: ({ colonies }) => colonies,
  });

export const colonyQuery = (roomId: string, colonyId: string) =>
  queryOptions({
    queryKey: [roomId, 'colony', colonyId],
    queryFn: ({ signal }) => call(readColony, { params: { roomId, colonyId }, signal }),
  });

export type ColonyTold = z.output<typeof readColony.output>;

/** All holds of a colony, the ended ones too. */
export const colonyHoldsQuery = (roomId: string, colonyId: string) =>
  queryOptions({
    queryKey: [roomId, 'colony', colonyId, 'holds'],
    queryFn: ({ signal }) => call(listHolds, { params: { roomId }, query: { which: 'all', colonyId }, signal }),
    select: ({ holds }) => holds,
  });

export const allBroodsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'colonies', 'broods'],
    queryFn: ({ signal }) => call(listBroods, { params: { roomId }, query: { which: 'all' }, signal }),
    select: ({ broods }) => broods,
  });

export const strainsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'colonies', 'strains'],
    queryFn: ({ signal }) => call(listStrains, { params: { roomId }, signal }),
    select: ({ strains }) => strains,
  });

export const livingFishQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'colonies', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params: { roomId }, signal }),
    select: ({ fish }) => fish,
  });

export function useAddColony() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof addColony.body>) => call(addColony, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useChangeColony(colonyId: string) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeColony.body>) => call(changeColony, { params: { roomId, colonyId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
