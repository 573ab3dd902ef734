import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { type ImportAsk, listImports, previewImport, runImport, undoImport } from '@/shared/transfer/contract';

export const importsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'imports'],
    queryFn: ({ signal }) => call(listImports, { params: { roomId }, signal }),
  });

/** The preview of exactly this asking; an earlier one stays on the screen until it is there. */
export const usePreview = (roomId: string, ask: ImportAsk) =>
  useQuery({
    queryKey: [roomId, 'importPreview', ask],
    queryFn: ({ signal }) => call(previewImport, { params: { roomId }, body: ask, signal }),
    placeholderData: (before) => before,
    // A file may be large, and its preview is of no use later.
    gcTime: 0,
    retry: false,
  });

export function useImports(roomId: string) {
  const cache = useQueryClient();
  const onSuccess = () => cache.invalidateQueries({ queryKey: [roomId] });
  return {
    run: useMutation({ mutationFn: (body: ImportAsk) => call(runImport, { params: { roomId }, body }), onSuccess }),
    undo: useMutation({
      mutationFn: (importId: string) => call(undoImport, { params: { roomId, importId } }),
      onSuccess,
    }),
  };
}
