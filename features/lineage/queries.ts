import { queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { readPedigree } from '@/shared/lineage/contract';

/** The whole pedigree of the fishroom; everything of the Lineage place is worked out from it here. */
export const pedigreeQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'pedigree'],
    queryFn: ({ signal }) => call(readPedigree, { params: { roomId }, query: {}, signal }),
    select: ({ nodes }) => nodes,
  });

/** One animal with all its possible ancestors and its descendants. */
export const pedigreeAroundQuery = (roomId: string, id: string) =>
  queryOptions({
    queryKey: [roomId, 'pedigree', id],
    queryFn: ({ signal }) => call(readPedigree, { params: { roomId }, query: { around: id }, signal }),
    select: ({ nodes }) => nodes,
  });
