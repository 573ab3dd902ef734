import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { Loading } from '@/components/ui/Loading';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { residentsWords, useTanks } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { DayText } from '@/shared/days';
import { Heads } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import type { BatchesOf } from './useBatches';

const Draft = z.strictObject({
  heads: spelledHeads(Heads),
  toTankId: z.string('Choose a tank'),
  onDay: DayText,
  note: NoteDraft,
});

/** Part of a batch goes to another tank as a batch of its own; it keeps its broods. */
export function SplitForm(of: BatchesOf) {
  return (
    <InBatch title="Move part" form="split" of={of}>
      {(batch) => <Fields key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function Fields({ batch }: { batch: BatchTold }) {
  const { today } = useRoom();
  const { data: tanks } = useTanks();
  const entry = useEntryForm({
    title: 'Move part',
    draft: `split:${batch.id}`,
    schema: Draft,
    start: { heads: '', toTankId: '', onDay: today, note: '' },
    content: ({ heads, toTankId, onDay, note }, idOf) => ({
      kind: 'batchSplit',
      batchId: batch.id,
      newBatchId: idOf('batch'),
      toTankId,
      heads,
      onDay,
      note,
    }),
  });
  if (!tanks) return <Loading label="Loading the tanks" />;
  return (
    <EntryPage entry={entry} subtitle={<BatchLine batch={batch} />} saveLabel="Move them">
      <Part title="How many?" aside={`${batch.balance} are there`}>
        <NumberField name="heads" label="Heads to move" unit="heads" whole />
      </Part>
      <SelectField
        name="toTankId"
        label="Into which tank"
        options={tanks
          .filter(({ id }) => id !== batch.tank?.id)
          .map((tank) => ({ value: tank.id, code: tank.code, word: residentsWords(tank) }))}
      />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
