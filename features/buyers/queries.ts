import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { addressOf, call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listOffers } from '@/shared/buyers/offers';
import type { RequestLetter } from '@/shared/buyers/requestLetters';
import { listRequests, previewRequestLetter } from '@/shared/buyers/requests';
import { listPhotos, showPhoto } from '@/shared/photos/contract';

export const offersQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'offers'],
    queryFn: ({ signal }) => call(listOffers, { params: { roomId }, signal }),
  });

/** Photos to choose from: of a brood, or without one all of the fishroom. */
export const photosToShowQuery = (roomId: string, broodId: string | null) =>
  queryOptions({
    queryKey: [roomId, 'photosToShow', broodId],
    queryFn: ({ signal }) =>
      call(listPhotos, { params: { roomId }, query: broodId ? { thing: 'brood', thingId: broodId } : {}, signal }),
    select: ({ photos }) => photos,
  });

export const smallPhoto = (roomId: string, photoId: string): string =>
  addressOf(showPhoto, { params: { roomId, photoId, size: 'small' } });

/** Runs a write and refreshes the fishroom. */
export function useAct() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (job: () => Promise<unknown>) => job(),
    onSettled: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export const requestsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'requests'],
    queryFn: ({ signal }) => call(listRequests, { params: { roomId }, signal }),
    select: ({ requests }) => requests,
  });

export const requestLetterQuery = (roomId: string, requestId: string, kind: RequestLetter) =>
  queryOptions({
    queryKey: [roomId, 'requestLetter', requestId, kind],
    queryFn: ({ signal }) => call(previewRequestLetter, { params: { roomId, requestId }, query: { kind }, signal }),
  });
