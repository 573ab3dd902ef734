import type { QueryClient } from '@tanstack/react-query';
import type { FishRow } from '@/shared/fish/contract';
import type { HoldRow } from '@/shared/holds/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { holdsAfter } from './holdsHere';
import { queue } from './queue';

type WithHolds = { holds: HoldRow[] };

/**
 * Shows holds that were recorded or ended without a signal among the fetched ones, so that the next record can be about
 * them. What was fetched is remembered as it came: undone, it is shown again.
 */
export function showHeld(cache: QueryClient, roomId: string): () => void {
  const lists = [
    [roomId, 'holds', 'open'],
    [roomId, 'today'],
  ].map((queryKey) => ({ queryKey, fetched: cache.getQueryData<WithHolds>(queryKey) }));
  const show = () => {
    const entries = queue.state().entries.filter((entry) => entry.roomId === roomId);
    const tanks = cache.getQueryData<{ tanks: TankRow[] }>([roomId, 'record', 'tanks'])?.tanks ?? [];
    const fish = cache.getQueryData<{ fish: FishRow[] }>([roomId, 'record', 'fish'])?.fish ?? [];
    for (const { queryKey, fetched } of lists) {
      if (!fetched) continue;
      const holds = holdsAfter(fetched.holds, entries, { tanks, fish });
      const shown = cache.getQueryData<WithHolds>(queryKey);
      if (!shown || sameIds(shown.holds, holds)) continue;
      const updatedAt = cache.getQueryState(queryKey)?.dataUpdatedAt;
      cache.setQueryData(queryKey, { ...fetched, holds }, updatedAt ? { updatedAt } : {});
    }
  };
  const endCache = cache.getQueryCache().subscribe((event) => {
    if (event.type !== 'updated' || event.action.type !== 'success' || event.action.manual) return;
    const list = lists.find(({ queryKey }) => String(queryKey) === String(event.query.queryKey));
    if (list) list.fetched = cache.getQueryData<WithHolds>(list.queryKey);
    // Also when tanks or fish have come: they name what is shown.
    show();
  });
  const endQueue = queue.listen(show);
  return () => {
    endCache();
    endQueue();
  };
}

const sameIds = (a: readonly HoldRow[], b: readonly HoldRow[]): boolean =>
  a.length === b.length && a.every(({ id }, i) => id === b[i]?.id);
