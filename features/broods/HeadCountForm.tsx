import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { TextField } from '@/components/form/TextField';
import { Text } from '@/components/ui/Text';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { DayText, fromToday } from '@/shared/days';
import { HeadsOrNone } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import type { BatchesOf } from './useBatches';

const Draft = z.strictObject({ heads: spelledHeads(HeadsOrNone), onDay: DayText, note: NoteDraft });

/** The heads seen. The first count of free-swimming fry opens the ledger. */
export function HeadCountForm(of: BatchesOf) {
  return (
    <InBatch title="Head count" form="head-count" of={of}>
      {(batch) => <Fields key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function Fields({ batch }: { batch: BatchTold }) {
  const { today } = useRoom();
  const opens = batch.lines.length === 0;
  const entry = useEntryForm({
    title: opens ? 'Free-swimming' : 'Head count',
    draft: `headCount:${batch.id}`,
    schema: Draft,
    start: { heads: '', onDay: today, note: '' },
    content: ({ heads, onDay, note }) => ({ kind: 'headCounted', batchId: batch.id, heads, onDay, note }),
    odd: ({ heads }) =>
      !opens && heads > batch.balance + 2
        ? `${heads} are ${heads - batch.balance} more than on the books. Keep it?`
        : null,
  });
  const last = batch.lines.findLast(({ kind }) => kind === 'recount' || kind === 'opening');
  const seen = Number(entry.form.values.heads);
  const missing = entry.form.values.heads !== '' && Number.isInteger(seen) ? batch.balance - seen : 0;
  return (
    <EntryPage
      entry={entry}
      subtitle={<BatchLine batch={batch} />}
      saveLabel={opens ? 'Open the head count' : 'Save head count'}
    >
      <Part title="How many are there?" aside={last ? `last counted ${fromToday(last.on, today)}` : 'first count'}>
        <NumberField name="heads" label="Heads seen" unit="heads" whole />
        <Text size="small" tone="soft">
          {opens
            ? 'The head count opens with this number, and survival is reckoned from it.'
            : missing > 0
              ? `${missing} not found: a correction, not a loss. Record the dead as losses.`
              : 'What is found too few or too many is a correction, not a loss.'}
        </Text>
      </Part>
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
