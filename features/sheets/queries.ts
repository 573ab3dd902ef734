import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import {
  checkSheetPage,
  issueSheet,
  listSheets,
  previewSheet,
  readSheet,
  type SheetDraft,
  withdrawSheet,
} from '@/shared/sheets/contract';

export type Subject = { thing: 'fish' | 'brood'; id: string };

export const sheetsQuery = (roomId: string, of?: Subject) =>
  queryOptions({
    queryKey: [roomId, 'sheets', of?.id ?? 'all'],
    queryFn: ({ signal }) =>
      call(listSheets, { params: { roomId }, query: of ? { thing: of.thing, thingId: of.id } : {}, signal }),
    select: ({ sheets }) => sheets,
  });

export const previewQuery = (roomId: string, { thing, id }: Subject) =>
  queryOptions({
    queryKey: [roomId, 'sheetPreview', id],
    queryFn: ({ signal }) => call(previewSheet, { params: { roomId }, query: { thing, id }, signal }),
    select: ({ content }) => content,
  });

export const sheetQuery = (roomId: string, sheetId: string) =>
  queryOptions({
    queryKey: [roomId, 'sheet', sheetId],
    queryFn: ({ signal }) => call(readSheet, { params: { roomId, sheetId }, signal }),
  });

export type SheetTold = z.output<typeof readSheet.output>;

/** What anyone with the address may see. */
export const checkedQuery = (token: string) =>
  queryOptions({
    queryKey: ['checkedSheet', token],
    queryFn: ({ signal }) => call(checkSheetPage, { params: { token }, signal }),
    retry: false,
  });

export function useIssueSheet() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: SheetDraft) => call(issueSheet, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}

export function useWithdrawSheet(sheetId: string) {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof withdrawSheet.body>) =>
      call(withdrawSheet, { params: { roomId, sheetId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
