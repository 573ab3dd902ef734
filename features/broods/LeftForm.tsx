import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { Caution } from '@/components/ui/Caution';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { DayText } from '@/shared/days';
import { Heads } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import type { BatchesOf } from './useBatches';

const HOW = ['given', 'traded', 'sold', 'auctioned'] as const;
const HOW_WORDS = { given: 'Given away', traded: 'Traded', sold: 'Sold, without an order', auctioned: 'Auctioned' };

const Draft = z.strictObject({
  how: z.enum(HOW, 'Choose how they left'),
  heads: spelledHeads(Heads),
  onDay: DayText,
  note: NoteDraft,
});

/** Heads that left otherwise than by an order. */
export function LeftForm(of: BatchesOf) {
  return (
    <InBatch title="Left" form="left" of={of}>
      {(batch) => <Fields key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function Fields({ batch }: { batch: BatchTold }) {
  const { today } = useRoom();
  const entry = useEntryForm({
    title: 'Left',
    draft: `left:${batch.id}`,
    schema: Draft,
    start: { how: 'given' as const, heads: '', onDay: today, note: '' },
    content: ({ how, heads, onDay, note }) => ({ kind: 'headsLeft', batchId: batch.id, how, heads, onDay, note }),
  });
  return (
    <EntryPage entry={entry} subtitle={<BatchLine batch={batch} />} saveLabel="Save">
      <SelectField name="how" label="How they left" options={HOW.map((value) => ({ value, word: HOW_WORDS[value] }))} />
      <Part title="How many?" aside={`${batch.balance} are there`}>
        <NumberField name="heads" label="Heads" unit="heads" whole />
      </Part>
      <Caution words="Moving live fish may need a permit, and carriers have rules of their own: check locally. Never release fish." />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="To whom, or a note" aside="not needed" long />
    </EntryPage>
  );
}
