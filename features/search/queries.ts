import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { namePages, searchAll } from '@/shared/search/contract';

export const searchQuery = (roomId: string, q: string) =>
  queryOptions({
    queryKey: [roomId, 'search', q],
    queryFn: ({ signal }) => call(searchAll, { params: { roomId }, query: { q }, signal }),
    enabled: q !== '',
    placeholderData: keepPreviousData,
    retry: false,
    // Every few letters are a question of their own: none of them is worth keeping on the device.
    persister: undefined,
    gcTime: 60_000,
  });

export const openedQuery = (roomId: string, pages: string[]) =>
  queryOptions({
    queryKey: [roomId, 'opened', pages.join(',')],
    queryFn: ({ signal }) => call(namePages, { params: { roomId }, query: { pages: pages.join(',') }, signal }),
    enabled: pages.length > 0,
  });
