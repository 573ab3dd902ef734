import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { addSpecies, listSpecies, setSpecies } from '@/shared/species/contract';

export const speciesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'species'],
    queryFn: ({ signal }) => call(listSpecies, { params: { roomId }, signal }),
    select: ({ set }) => set,
  });

export function useAddSpecies() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof addSpecies.body>) => call(addSpecies, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useSetSpecies(speciesId: string) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof setSpecies.body>) => call(setSpecies, { params: { roomId, speciesId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
