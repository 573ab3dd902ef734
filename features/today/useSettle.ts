import { useMutation, useQueryClient } from '@tanstack/react-query';
import { use } from 'react';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { ToldContext } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { decideTask } from '@/shared/today/contract';
import type { Due } from '@/shared/today/due';

export type Decision =
  | { decision: 'done' }
  | { decision: 'skip'; because: string }
  | { decision: 'snooze'; until: string }
  | { decision: 'assign'; assignedTo: string | null };

const NOTHING = { because: null, until: null, assignedTo: null };

/** Sends what was decided about a task, and says so above the bottom bar with the way back. */
export function useSettle(due: Pick<Due, 'key'>, what: string, onSettled: () => void) {
  const { today } = useRoom();
  const { tell } = use(ToldContext);
  const decide = useDecide();
  const settle = async (decision: Decision) => {
    await decide.mutateAsync({ taskKey: due.key, ...NOTHING, ...decision });
    onSettled();
    if (decision.decision === 'assign') return;
    const bringBack = () => decide.mutateAsync({ taskKey: due.key, decision: 'open', ...NOTHING });
    tell({ is: 'settled', key: due.key, words: `${what}. ${wordsOf(decision, today)}`, bringBack });
  };
  return { settle, error: decide.error, busy: decide.isPending };
}

function wordsOf(decision: Exclude<Decision, { decision: 'assign' }>, today: string): string {
  switch (decision.decision) {
    case 'done':
      return 'Done.';
    case 'skip':
      return 'Skipped.';
    case 'snooze':
      return `Put off until ${formatDay(decision.until, today)}.`;
  }
}

/** Any decision about any task. */
export function useDecide() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ taskKey, ...body }: { taskKey: string } & z.input<typeof decideTask.body>) =>
      call(decideTask, { params: { roomId, taskKey }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
