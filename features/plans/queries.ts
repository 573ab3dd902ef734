import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listColonies } from '@/shared/colonies/contract';
import { addPlan, carryOutPlan, dropPlan, listPlans, readPlan } from '@/shared/plans/contract';
import { listSpecies } from '@/shared/species/contract';
import { listStrains } from '@/shared/strains/contract';
import { listTanks } from '@/shared/tanks/contract';

export const plansQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'plans'],
    queryFn: ({ signal }) => call(listPlans, { params: { roomId }, signal }),
    select: ({ plans }) => plans,
  });

export const planQuery = (roomId: string, planId: string) =>
  queryOptions({
    queryKey: [roomId, 'plans', planId],
    queryFn: ({ signal }) => call(readPlan, { params: { roomId, planId }, signal }),
  });

export const tanksQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'plans', 'tanks'],
    queryFn: ({ signal }) => call(listTanks, { params: { roomId }, signal }),
    select: ({ tanks }) => tanks.filter(({ retiredOn }) => retiredOn === null),
  });

export const strainsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'plans', 'strains'],
    queryFn: ({ signal }) => call(listStrains, { params: { roomId }, signal }),
    select: ({ strains }) => strains,
  });

/** What the fishroom set of its species; the library itself is in the app. */
export const speciesSetQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'plans', 'species'],
    queryFn: ({ signal }) => call(listSpecies, { params: { roomId }, signal }),
    select: ({ set }) => set,
  });

export const colonyCodesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'plans', 'colonies'],
    queryFn: ({ signal }) => call(listColonies, { params: { roomId }, signal }),
    select: ({ colonies }) => new Set(colonies.map(({ code }) => code)),
  });

function useRefreshed<Body, Answer>(write: (roomId: string, body: Body) => Promise<Answer>) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: Body) => write(roomId, body),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export const useAddPlan = () =>
  useRefreshed((roomId, body: z.input<typeof addPlan.body>) => call(addPlan, { params: { roomId }, body }));

export const useDropPlan = (planId: string) =>
  useRefreshed((roomId, body: z.input<typeof dropPlan.body>) => call(dropPlan, { params: { roomId, planId }, body }));

export const useCarryOut = (planId: string) =>
  useRefreshed((roomId, body: z.input<typeof carryOutPlan.body>) =>
    call(carryOutPlan, { params: { roomId, planId }, body }),
  );
