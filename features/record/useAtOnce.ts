import { useMutation } from '@tanstack/react-query';
import { useRecord } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import type { EntryContent } from '@/shared/record/kinds';
import type { RecordAction } from './actions';
import type { Here } from './useHere';

/** What is recorded by the tap itself: one found dead in the tank's only batch, a tank seen well. Null: it takes a form. */
export function useAtOnce({ tank }: Here, done: () => void) {
  const { today } = useRoom();
  const keep = useRecord();
  const record = useMutation({ mutationFn: (content: EntryContent) => keep(content), onSuccess: done });
  const batches = tank?.residents.filter(({ thing, heads }) => thing === 'batch' && heads > 0) ?? [];
  const [batch] = batches;
  const batchId = batches.length === 1 ? batch?.id : undefined;
  const act = ({ atOnce }: RecordAction): (() => void) | null => {
    if (atOnce === 'seenWell' && tank)
      return () => record.mutate({ kind: 'seenWell', tankId: tank.id, onDay: today, note: null });
    if (atOnce === 'oneDead' && batchId)
      return () =>
        record.mutate({ kind: 'headsLost', batchId, onDay: today, heads: 1, cause: 'foundDead', note: null });
    return null;
  };
  return { act, error: record.error, busy: record.isPending };
}
