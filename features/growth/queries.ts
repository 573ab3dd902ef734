import { queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { listSamples } from '@/shared/growth/contract';

export type SamplesOf = { thing: 'brood' | 'batch' | 'fish'; thingId: string };

export const samplesQuery = (roomId: string, of: SamplesOf) =>
  queryOptions({
    queryKey: [roomId, 'samples', of.thing, of.thingId],
    queryFn: ({ signal }) => call(listSamples, { params: { roomId }, query: of, signal }),
  });
