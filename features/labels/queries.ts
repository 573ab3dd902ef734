import { queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { listColonies } from '@/shared/colonies/contract';
import { listTanks } from '@/shared/tanks/contract';

export const tanksQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'labels', 'tanks'],
    queryFn: ({ signal }) => call(listTanks, { params: { roomId }, signal }),
    select: ({ tanks }) => tanks.filter(({ retiredOn }) => retiredOn === null),
  });

export const coloniesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'labels', 'colonies'],
    queryFn: ({ signal }) => call(listColonies, { params: { roomId }, signal }),
    select: ({ colonies }) => colonies.filter(({ endedOn }) => endedOn === null),
  });
