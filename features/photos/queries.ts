import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { addressOf, call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listPhotos, type Photo, removePhoto, showPhoto } from '@/shared/photos/contract';

export type PhotosOf = { thing: Photo['of']['thing']; thingId: string };

export const photosQuery = (roomId: string, of: PhotosOf) =>
  queryOptions({
    queryKey: [roomId, 'photos', of.thing, of.thingId],
    queryFn: ({ signal }) => call(listPhotos, { params: { roomId }, query: of, signal }),
    select: ({ photos }) => photos,
  });

/** Where the picture itself is: 320 px or 1280 px on the long edge. */
export const photoAddress = (roomId: string, photoId: string, size: 'small' | 'large'): string =>
  addressOf(showPhoto, { params: { roomId, photoId, size } });

export function useRemovePhoto() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (photoId: string) => call(removePhoto, { params: { roomId, photoId } }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
