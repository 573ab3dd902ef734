import { useMutation } from '@tanstack/react-query';
import { type Href, useRouter } from 'expo-router';
import { Notice } from '@/components/ui/Notice';
import { Rows } from '@/components/ui/Rows';
import { useQueue } from '@/features/entries';
import { writeDraft } from '@/features/entries/drafts';
import { heldBy } from './following';
import { queue } from './queue';
import { canSettle } from './settling';
import { useCodes } from './useCodes';
import { WaitingRow } from './WaitingRow';
import type { Waiting } from './waiting';

/** What waits on this device, newest first: seen, changed, undone. */
export function WaitingList() {
  const { entries, sendingId } = useQueue();
  const codeOf = useCodes(entries);
  const act = useWaitingActs();
  return (
    <>
      {act.error ? <Notice tone="act" alert words={act.error.message} /> : null}
      <Rows label="Records that wait here">
        {entries.toReversed().map((entry) => (
          <WaitingRow
            key={entry.id}
            entry={entry}
            sending={entry.id === sendingId}
            heldBy={heldBy(entry, entries)}
            codeOf={codeOf}
            onUndo={() => act.undo(entry)}
            onEdit={() => act.edit(entry)}
            onAsItIs={() => act.asItIs(entry)}
            settleHref={canSettle(entry) ? `/r/${entry.roomId}/waiting/${entry.id}` : null}
          />
        ))}
      </Rows>
    </>
  );
}

function useWaitingActs() {
  const router = useRouter();
  const work = useMutation({ mutationFn: (act: () => Promise<unknown>) => act() });
  return {
    error: work.error,
    undo: ({ id }: Waiting) => work.mutate(() => queue.takeBack(id)),
    asItIs: ({ id, state }: Waiting) =>
      work.mutate(() => (state === 'editing' ? queue.edit(id, false) : queue.retry(id))),
    edit: ({ id, typed }: Waiting) =>
      work.mutate(async () => {
        if (!typed) return;
        await queue.edit(id, true);
        const { key, values, title, href, ids } = typed;
        writeDraft(key, { values, title, href, again: { entryId: id, ids } });
        router.push(href as Href); // an address of this app: the page that the form was on
      }),
  };
}
