import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { TextField } from '@/components/form/TextField';
import { Text } from '@/components/ui/Text';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { TankWords } from '@/features/entries/TankLine';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { DayText } from '@/shared/days';
import type { TankRow } from '@/shared/tanks/contract';
import { InTank } from './InTank';

const Draft = z.strictObject({ onDay: DayText, note: NoteDraft });

/** Looked at, and all is well: from then on nobody in it was holding who is not recorded. */
export function SeenWellForm({ tankId }: { tankId?: string | undefined }) {
  return (
    <InTank title="Seen well" form="seen-well" tankId={tankId}>
      {(tank) => <Fields key={tank.id} tank={tank} />}
    </InTank>
  );
}

function Fields({ tank }: { tank: TankRow }) {
  const { today } = useRoom();
  const entry = useEntryForm({
    title: 'Seen well',
    draft: `seenWell:${tank.id}`,
    schema: Draft,
    start: { onDay: today, note: '' },
    content: ({ onDay, note }) => ({ kind: 'seenWell', tankId: tank.id, onDay, note }),
  });
  return (
    <EntryPage entry={entry} subtitle={<TankWords tank={tank} />} saveLabel="Save as seen well">
      <Text tone="soft">
        You looked at every fish. Whoever is not recorded as holding was not holding on this day: a later hold counts
        from it.
      </Text>
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
