import { queryOptions } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { listBroods, proposeBrood, readBatch, readBrood } from '@/shared/broods/contract';
import { listFish, proposeFishCodes } from '@/shared/fish/contract';
import { listStrains } from '@/shared/strains/contract';

export const broodsQuery = (roomId: string, which: 'here' | 'all') =>
  queryOptions({
    queryKey: [roomId, 'broods', which],
    queryFn: ({ signal }) => call(listBroods, { params: { roomId }, query: { which }, signal }),
    select: ({ broods }) => broods,
  });

export const broodQuery = (roomId: string, broodId: string) =>
  queryOptions({
    queryKey: [roomId, 'brood', broodId],
    queryFn: ({ signal }) => call(readBrood, { params: { roomId, broodId }, signal }),
  });

export type BroodTold = z.output<typeof readBrood.output>;

export const batchQuery = (roomId: string, batchId: string) =>
  queryOptions({
    queryKey: [roomId, 'batch', batchId],
    queryFn: ({ signal }) => call(readBatch, { params: { roomId, batchId }, signal }),
  });

/** Free codes after a brood's strain, for fish that are held back. */
export const fishCodesQuery = (roomId: string, stem: string, count: number) =>
  queryOptions({
    queryKey: [roomId, 'fishCodes', stem, count],
    queryFn: ({ signal }) =>
      call(proposeFishCodes, { params: { roomId }, query: { stem, count: String(count) }, signal }),
    select: ({ codes }) => codes,
  });

export const strainsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'broods', 'strains'],
    queryFn: ({ signal }) => call(listStrains, { params: { roomId }, signal }),
    select: ({ strains }) => strains,
  });

export const adultsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'broods', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params: { roomId }, signal }),
    select: ({ fish }) => fish,
  });

export const broodCodeQuery = (roomId: string, strainId: string | null, onDay: string) =>
  queryOptions({
    queryKey: [roomId, 'broodCode', strainId, onDay],
    queryFn: ({ signal }) =>
      call(proposeBrood, { params: { roomId }, query: { onDay, ...(strainId ? { strainId } : {}) }, signal }),
    select: ({ code }) => code,
  });
