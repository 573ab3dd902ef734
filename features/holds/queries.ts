import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { proposeBrood } from '@/shared/broods/contract';
import type { Day } from '@/shared/days';
import { listFish } from '@/shared/fish/contract';
import { listHolds, proposeSires, readHold } from '@/shared/holds/contract';
import type { Proposal } from './beginning';
import { proposalHere } from './proposalHere';

export const holdQuery = (roomId: string, holdId: string) =>
  queryOptions({
    queryKey: [roomId, 'holds', holdId],
    queryFn: ({ signal }) => call(readHold, { params: { roomId, holdId }, signal }),
  });

export type HoldTold = z.output<typeof readHold.output>;

export const openHoldsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'holds', 'open'],
    queryFn: ({ signal }) => call(listHolds, { params: { roomId }, query: { which: 'open' }, signal }),
    select: ({ holds }) => holds,
  });

/** Who may be the sires of a spawn between two days in a tank; while other days are looked up, what was known stays. */
export function useProposal(tankId: string, from: Day, until: Day) {
  const { id: roomId } = useRoom();
  return useQuery({
    queryKey: [roomId, 'holds', 'proposal', tankId, from, until],
    queryFn: ({ signal }) => call(proposeSires, { params: { roomId, tankId }, query: { from, until }, signal }),
    placeholderData: keepPreviousData,
  });
}

/** The same without a signal, out of what this device has seen before. */
export function useProposalHere(tankId: string, wanted: boolean): Proposal | null {
  const { id: roomId } = useRoom();
  const holds = useQuery({ ...openHoldsQuery(roomId), enabled: wanted });
  const fish = useQuery({
    queryKey: [roomId, 'record', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params: { roomId }, signal }),
    enabled: wanted,
  });
  return wanted && fish.data ? proposalHere(tankId, fish.data.fish, holds.data ?? []) : null;
}

/** The next free code for a brood of a strain. */
export function useBroodCode(strainId: string | null, onDay: Day) {
  const { id: roomId } = useRoom();
  return useQuery({
    queryKey: [roomId, 'holds', 'brood code', strainId, onDay],
    queryFn: ({ signal }) =>
      call(proposeBrood, { params: { roomId }, query: { onDay, ...(strainId ? { strainId } : {}) }, signal }),
    select: ({ code }) => code,
  });
}
