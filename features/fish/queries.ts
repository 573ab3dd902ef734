import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listColonies } from '@/shared/colonies/contract';
import { addFish, changeFish, listFish, proposeFishCodes, readFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import { mergeFish } from '@/shared/lineage/contract';
import { listStrains, readStrain } from '@/shared/strains/contract';

export const fishListQuery = (roomId: string, which: 'living' | 'all') =>
  queryOptions({
    queryKey: [roomId, 'fish', which],
    queryFn: ({ signal }) => call(listFish, { params: { roomId }, query: { which }, signal }),
    select: ({ fish }) => fish,
  });

export const fishQuery = (roomId: string, fishId: string) =>
  queryOptions({
    queryKey: [roomId, 'oneFish', fishId],
    queryFn: ({ signal }) => call(readFish, { params: { roomId, fishId }, signal }),
  });

export type FishTold = z.output<typeof readFish.output>;

export const holdsOfQuery = (roomId: string, fishId: string) =>
  queryOptions({
    queryKey: [roomId, 'oneFish', fishId, 'holds'],
    queryFn: ({ signal }) => call(listHolds, { params: { roomId }, query: { which: 'all', holderId: fishId }, signal }),
    select: ({ holds }) => holds,
  });

export const strainsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'fish', 'strains'],
    queryFn: ({ signal }) => call(listStrains, { params: { roomId }, signal }),
    select: ({ strains }) => strains,
  });

export const lotsQuery = (roomId: string, strainId: string) =>
  queryOptions({
    queryKey: [roomId, 'fish', 'lots', strainId],
    queryFn: ({ signal }) => call(readStrain, { params: { roomId, strainId }, signal }),
    select: ({ lots }) => lots,
    enabled: strainId !== '',
  });

export const coloniesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'fish', 'colonies'],
    queryFn: ({ signal }) => call(listColonies, { params: { roomId }, signal }),
    select: ({ colonies }) => colonies.filter(({ endedOn }) => endedOn === null),
  });

export const codesQuery = (roomId: string, stem: string, count: number) =>
  queryOptions({
    queryKey: [roomId, 'fish', 'codes', stem, count],
    queryFn: ({ signal }) =>
      call(proposeFishCodes, { params: { roomId }, query: { stem, count: String(count) }, signal }),
    select: ({ codes }) => codes,
    enabled: stem !== '' && count > 0,
  });

export function useAddFish() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof addFish.body>) => call(addFish, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useChangeFish(fishId: string) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeFish.body>) => call(changeFish, { params: { roomId, fishId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useMergeFish(fishId: string) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof mergeFish.body>) => call(mergeFish, { params: { roomId, fishId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
