import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { getMe, type Me } from '@/shared/accounts/contract';
import { Refusal } from '@/shared/refusal';
import { may } from '@/shared/roles';
import {
  type ImportDraft,
  importSheet,
  listImported,
  previewImport,
  readImported,
  type SheetSource,
} from '@/shared/sheets/importContract';
import { listStrains } from '@/shared/strains/contract';

export const importedListQuery = (roomId: string, fishId?: string) =>
  queryOptions({
    queryKey: [roomId, 'imported', fishId ?? 'all'],
    queryFn: ({ signal }) => call(listImported, { params: { roomId }, query: fishId ? { fishId } : {}, signal }),
    select: ({ sheets }) => sheets,
  });

export const importedQuery = (roomId: string, importId: string) =>
  queryOptions({
    queryKey: [roomId, 'imported', importId],
    queryFn: ({ signal }) => call(readImported, { params: { roomId, importId }, signal }),
  });

export const strainsHereQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'sheets', 'strains'],
    queryFn: ({ signal }) => call(listStrains, { params: { roomId }, signal }),
    select: ({ strains }) => strains.filter(({ retiredOn }) => retiredOn === null),
  });

/** What taking a sheet in would do; asked anew for every source. */
export const importPreviewQuery = (roomId: string, source: SheetSource | null) =>
  queryOptions({
    queryKey: [roomId, 'importPreview', source],
    queryFn: ({ signal }) => {
      if (!source) throw new Error('No sheet is chosen');
      return call(previewImport, { params: { roomId }, body: { source }, signal });
    },
    enabled: source !== null,
    retry: false,
  });

/** The fishrooms in which the reader may take a sheet in; none for whoever is signed out. */
export const roomsToTakeInQuery = queryOptions({
  queryKey: ['roomsToTakeIn'],
  queryFn: async ({ signal }): Promise<Me['rooms']> => {
    try {
      return (await call(getMe, { signal })).rooms.filter(({ role }) => may(role, 'stock:write'));
    } catch (error) {
      if (error instanceof Refusal && error.reason === 'signed-out') return [];
      throw error;
    }
  },
});

export function useTakeIn() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: ImportDraft) => call(importSheet, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
