import { useQueries } from '@tanstack/react-query';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { Notice } from '@/components/ui/Notice';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useTanks } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { DayText } from '@/shared/days';
import { Heads } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import { batchQuery } from './queries';
import { type BatchesOf, batchWords } from './useBatches';

const Draft = z.strictObject({
  heads: spelledHeads(Heads),
  intoBatchId: z.string('Choose the batch they join'),
  onDay: DayText,
  note: NoteDraft,
});

/** Broods share a tank: from then on a fish out of it comes from one of several pairs. */
export function JoinForm(of: BatchesOf) {
  return (
    <InBatch title="Join another batch" form="join" of={of}>
      {(batch) => <Fields key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function Fields({ batch }: { batch: BatchTold }) {
  const { id: roomId, today } = useRoom();
  const { data: tanks = [] } = useTanks();
  const ids = tanks.flatMap(({ residents }) =>
    residents.filter(({ thing, id, heads }) => thing === 'batch' && id !== batch.id && heads > 0).map(({ id }) => id),
  );
  const others = useQueries({ queries: ids.map((id) => batchQuery(roomId, id)) }).flatMap(({ data }) => data ?? []);
  const entry = useEntryForm({
    title: 'Join another batch',
    draft: `join:${batch.id}`,
    schema: Draft,
    start: { heads: String(batch.balance), intoBatchId: '', onDay: today, note: '' },
    content: ({ heads, intoBatchId, onDay, note }) => ({
      kind: 'batchJoined',
      batchId: batch.id,
      intoBatchId,
      heads,
      onDay,
      note,
    }),
  });
  return (
    <EntryPage entry={entry} subtitle={<BatchLine batch={batch} />} saveLabel="Join them">
      <Notice
        tone="look"
        words="Once mixed, the broods cannot be told apart: fish taken out of the batch have several possible pairs of parents."
      />
      <Part title="How many?" aside={`${batch.balance} are there`}>
        <NumberField name="heads" label="Heads that join" unit="heads" whole />
      </Part>
      <SelectField
        name="intoBatchId"
        label="Into which batch"
        options={others.map((other) => ({ value: other.id, word: batchWords(other) }))}
      />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
