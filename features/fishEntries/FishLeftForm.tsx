import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { DayText } from '@/shared/days';
import { EXIT_WORDS, EXITS } from '@/shared/fish/contract';
import { FishLine } from './FishLine';
import { WhichFish } from './WhichFish';
import { type FishHere, type Opened, WithFish } from './WithFish';

const Draft = z.strictObject({
  fishId: z.string('Choose which fish'),
  how: z.enum(EXITS, 'Choose how it left'),
  cause: z.optional(z.string().check(z.maxLength(120, 'Keep it under 120 letters'))),
  onDay: DayText,
  note: NoteDraft,
});
type Draft = z.input<typeof Draft>;

/** A single fish died, or went to someone. */
export function FishLeftForm(opened: Opened) {
  return (
    <WithFish title="Fish died" form="fish-left" {...opened}>
      {(here) => <Fields here={here} />}
    </WithFish>
  );
}

function Fields({ here }: { here: FishHere }) {
  const room = useRoom();
  const start: Draft = { fishId: here.chosen?.id ?? '', how: 'died', cause: '', onDay: room.today, note: '' };
  const entry = useEntryForm({
    title: 'Fish died',
    draft: `left:${here.tank?.id ?? here.chosen?.id}`,
    schema: Draft,
    start,
    content: ({ fishId, how, cause, onDay, note }) => ({
      kind: 'fishLeft',
      fishId,
      how,
      cause: cause?.trim() || null,
      onDay,
      note,
    }),
  });
  const { how } = entry.form.values;
  return (
    <EntryPage entry={entry} subtitle={<FishLine here={here} />} saveLabel={how === 'died' ? 'Save death' : 'Save'}>
      <WhichFish fish={here.fish} label="Which fish?" anonymous />
      <SelectField
        name="how"
        label="How"
        options={EXITS.filter((exit) => exit !== 'merged').map((exit) => ({ value: exit, word: EXIT_WORDS[exit] }))}
      />
      <TextField name="cause" label={how === 'died' ? 'Cause' : 'To whom'} aside="if known" />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={room.today} hint={`Recorded by ${room.accountName}`} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
