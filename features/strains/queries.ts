import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listSpecies } from '@/shared/species/contract';
import { addLot, addStrain, changeStrain, listStrains, readStrain } from '@/shared/strains/contract';

export const strainsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'strains'],
    queryFn: ({ signal }) => call(listStrains, { params: { roomId }, signal }),
    select: ({ strains }) => strains,
  });

export const strainQuery = (roomId: string, strainId: string) =>
  queryOptions({
    queryKey: [roomId, 'strain', strainId],
    queryFn: ({ signal }) => call(readStrain, { params: { roomId, strainId }, signal }),
  });

export type StrainTold = z.output<typeof readStrain.output>;

/** What this fishroom changed of the library, and its own species. */
export const setSpeciesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'strains', 'species'],
    queryFn: ({ signal }) => call(listSpecies, { params: { roomId }, signal }),
    select: ({ set }) => set,
  });

function useChanging<Body, Result>(change: (roomId: string, body: Body) => Promise<Result>) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: Body) => change(roomId, body),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export const useAddStrain = () =>
  useChanging((roomId, body: z.input<typeof addStrain.body>) => call(addStrain, { params: { roomId }, body }));

export const useChangeStrain = (strainId: string) =>
  useChanging((roomId, body: z.input<typeof changeStrain.body>) =>
    call(changeStrain, { params: { roomId, strainId }, body }),
  );

export const useAddLot = (strainId: string) =>
  useChanging((roomId, body: z.input<typeof addLot.body>) => call(addLot, { params: { roomId, strainId }, body }));
