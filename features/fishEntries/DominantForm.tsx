import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { TextField } from '@/components/form/TextField';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { DayText } from '@/shared/days';
import { FishLine } from './FishLine';
import { WhichFish } from './WhichFish';
import { type FishHere, type Opened, WithFish } from './WithFish';

const Draft = z.strictObject({ fishId: z.string('Choose which male'), onDay: DayText, note: NoteDraft });

/** "Dominant from today": another male of the tank that was, is no longer. */
export function DominantForm(opened: Opened) {
  return (
    <WithFish title="Dominant" form="dominant" {...opened}>
      {(here) => <Fields here={here} />}
    </WithFish>
  );
}

function Fields({ here }: { here: FishHere }) {
  const { today } = useRoom();
  const males = here.fish.filter(({ sex }) => sex !== 'female');
  const only = males.length === 1 ? males[0] : undefined;
  const entry = useEntryForm({
    title: 'Dominant',
    draft: `dominant:${here.tank?.id ?? here.chosen?.id}`,
    schema: Draft,
    start: { fishId: here.chosen?.id ?? only?.id ?? '', onDay: today, note: '' },
    content: ({ fishId, onDay, note }) => ({ kind: 'dominant', fishId, onDay, note }),
  });
  return (
    <EntryPage entry={entry} subtitle={<FishLine here={here} />} saveLabel="Save as dominant">
      <WhichFish
        fish={males}
        label="Which male?"
        noteOf={({ dominant }) => (dominant ? 'dominant now' : null)}
        anonymous
      />
      <Part title="From">
        <DateField name="onDay" label="From" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
