import { type QueryClient, queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { listBroods, readBatch } from '@/shared/broods/contract';
import { listFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import { listTanks } from '@/shared/tanks/contract';
import { readToday } from '@/shared/today/contract';

/** Asked for again when it is older than this. */
const NEAR_MS = 5 * 60_000;

/**
 * What the Record forms need, fetched ahead under the keys that they ask by, so that each of them opens without a signal
 * also where it was never opened with one.
 */
export async function fetchNear(cache: QueryClient, roomId: string): Promise<void> {
  const params = { roomId };
  await Promise.allSettled([
    cache.prefetchQuery({
      queryKey: [roomId, 'today'],
      queryFn: ({ signal }) => call(readToday, { params, signal }),
      staleTime: NEAR_MS,
    }),
    cache.prefetchQuery({
      queryKey: [roomId, 'record', 'fish'],
      queryFn: ({ signal }) => call(listFish, { params, signal }),
      staleTime: NEAR_MS,
    }),
    cache.prefetchQuery({
      queryKey: [roomId, 'holds', 'open'],
      queryFn: ({ signal }) => call(listHolds, { params, query: { which: 'open' }, signal }),
      staleTime: NEAR_MS,
    }),
    cache.prefetchQuery({
      queryKey: [roomId, 'broods', 'here'],
      queryFn: ({ signal }) => call(listBroods, { params, query: { which: 'here' }, signal }),
      staleTime: NEAR_MS,
    }),
  ]);
  const tanks = await cache.fetchQuery(tanksNear(roomId));
  const batches = tanks.tanks.flatMap(({ residents }) => residents.filter(({ thing }) => thing === 'batch'));
  // One after the other: they are many, and nobody waits for them.
  for (const { id: batchId } of batches) {
    await cache.prefetchQuery({
      queryKey: [roomId, 'batch', batchId],
      queryFn: ({ signal }) => call(readBatch, { params: { roomId, batchId }, signal }),
      staleTime: NEAR_MS,
    });
  }
}

const tanksNear = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'record', 'tanks'],
    queryFn: ({ signal }) => call(listTanks, { params: { roomId }, signal }),
    staleTime: NEAR_MS,
  });
