import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { changeSheetSettings, listKeys, readSheetSettings, rotateKey } from '@/shared/sheets/contract';

export const sheetSettingsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'sheetSettings'],
    queryFn: ({ signal }) => call(readSheetSettings, { params: { roomId }, signal }),
  });

export const keysQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'sheetKeys'],
    queryFn: ({ signal }) => call(listKeys, { params: { roomId }, signal }),
  });

export function useChangeSheetSettings() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (showPeople: boolean) => call(changeSheetSettings, { params: { roomId }, body: { showPeople } }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useRotateKey() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => call(rotateKey, { params: { roomId } }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
