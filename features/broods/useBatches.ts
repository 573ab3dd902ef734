import { useQueries, useQuery } from '@tanstack/react-query';
import { useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { batchQuery, broodQuery } from './queries';

/** What a form was opened on; the narrowest that is given counts. */
export type BatchesOf = { tank?: string | undefined; brood?: string | undefined; batch?: string | undefined };

type Found = { batches: BatchTold[] | undefined; error: Error | null };

/** The batches that a form may be about: one, those of a brood that are here, or those that swim in a tank. */
export function useBatches({ tank, brood, batch }: BatchesOf): Found {
  const { id: roomId } = useRoom();
  const tanks = useTanks();
  const broodPage = useQuery({
    ...broodQuery(roomId, brood ?? ''),
    enabled: brood !== undefined && batch === undefined,
  });
  const inTank = tanks.data?.find(({ id }) => id === tank)?.residents.filter(({ thing }) => thing === 'batch') ?? [];
  const ids = batch ? [batch] : brood ? [] : inTank.map(({ id }) => id);
  const one = useQueries({ queries: ids.map((id) => batchQuery(roomId, id)) });
  if (brood && !batch) return { batches: broodPage.data?.batches.filter(isHere), error: broodPage.error };
  const error = tanks.error ?? one.find((query) => query.error)?.error ?? null;
  if (!tanks.data || one.some(({ data }) => !data)) return { batches: undefined, error };
  return { batches: one.flatMap(({ data }) => data ?? []), error };
}

const isHere = ({ tank, balance, lines }: BatchTold): boolean => tank !== null && (balance > 0 || lines.length === 0);

/** "DUMA-26C in N2, 29 heads". */
export const batchWords = ({ sources, tank, balance, lines }: BatchTold): string =>
  `${sources.map(({ code }) => code).join(' + ')}${tank ? ` in ${tank.code}` : ''}, ${lines.length === 0 ? 'not counted yet' : `${balance} heads`}`;
