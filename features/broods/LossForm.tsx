import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { LOSS_CAUSE_WORDS, LOSS_CAUSES } from '@/shared/broods/headEntry';
import { DayText } from '@/shared/days';
import { Heads } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import type { BatchesOf } from './useBatches';

const Draft = z.strictObject({
  what: z.enum(['loss', 'cull'], 'Choose loss or cull'),
  heads: spelledHeads(Heads),
  cause: z.enum(LOSS_CAUSES, 'Choose a cause'),
  onDay: DayText,
  note: NoteDraft,
});

/** Dead, or taken out on purpose. One found dead is one tap on the Record sheet; this is for the rest. */
export function LossForm(of: BatchesOf) {
  return (
    <InBatch title="Loss or cull" form="loss" of={of}>
      {(batch) => <Fields key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function Fields({ batch }: { batch: BatchTold }) {
  const { today } = useRoom();
  const entry = useEntryForm({
    title: 'Loss or cull',
    draft: `loss:${batch.id}`,
    schema: Draft,
    start: { what: 'loss' as const, heads: '1', cause: 'foundDead' as const, onDay: today, note: '' },
    content: ({ what, heads, cause, onDay, note }) =>
      what === 'loss'
        ? { kind: 'headsLost', batchId: batch.id, heads, cause, onDay, note }
        : { kind: 'headsCulled', batchId: batch.id, heads, onDay, note },
    odd: ({ heads }) => (heads > batch.balance ? `Only ${batch.balance} are on the books. Keep ${heads}?` : null),
  });
  const isLoss = entry.form.values.what === 'loss';
  return (
    <EntryPage entry={entry} subtitle={<BatchLine batch={batch} />} saveLabel={isLoss ? 'Save loss' : 'Save cull'}>
      <SegmentedField
        name="what"
        label="What happened"
        choices={[
          { value: 'loss', word: 'Lost' },
          { value: 'cull', word: 'Culled' },
        ]}
      />
      <Part title="How many?">
        <NumberField name="heads" label={isLoss ? 'Heads lost' : 'Heads culled'} unit="heads" whole />
      </Part>
      {isLoss ? (
        <SelectField
          name="cause"
          label="Cause"
          options={LOSS_CAUSES.map((value) => ({ value, word: LOSS_CAUSE_WORDS[value] }))}
        />
      ) : null}
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
