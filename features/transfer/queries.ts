import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { addressOf, call, refusalOf } from '@/features/call';
import {
  askDeletion,
  cancelDeletion,
  checkIntegrity,
  deleteAccount,
  importArchive,
  readDeletion,
} from '@/shared/transfer/contract';

export const deletionQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'deletion'],
    queryFn: ({ signal }) => call(readDeletion, { params: { roomId }, signal }),
  });

export const useCheck = (roomId: string) =>
  useMutation({ mutationFn: () => call(checkIntegrity, { params: { roomId } }) });

export function useDeletion(roomId: string) {
  const cache = useQueryClient();
  const onSuccess = () => cache.invalidateQueries({ queryKey: [roomId] });
  return {
    ask: useMutation({
      mutationFn: (name: string) => call(askDeletion, { params: { roomId }, body: { name } }),
      onSuccess,
    }),
    cancel: useMutation({ mutationFn: () => call(cancelDeletion, { params: { roomId } }), onSuccess }),
  };
}

export const useDeleteAccount = () =>
  useMutation({ mutationFn: (current: string | null) => call(deleteAccount, { body: { current } }) });

/** An archive is sent as a form, as pictures are; answers the new fishroom. */
export function useBringIn() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: async (file: File) => {
      const form = new FormData();
      form.set('file', file);
      const answer = await fetch(addressOf(importArchive), { method: 'POST', credentials: 'same-origin', body: form });
      if (!answer.ok) throw await refusalOf(answer);
      return importArchive.output.parse(await answer.json());
    },
    onSuccess: () => cache.invalidateQueries({ queryKey: ['me'] }),
  });
}
