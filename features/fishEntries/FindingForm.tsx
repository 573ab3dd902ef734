import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { DateField } from '@/components/form/DateField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { TextField } from '@/components/form/TextField';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { DayText } from '@/shared/days';
import { SEXES } from '@/shared/fish/contract';
import type { EntryContent } from '@/shared/record/kinds';
import { FishLine } from './FishLine';
import { WhichFish } from './WhichFish';
import { type FishHere, type Opened, WithFish } from './WithFish';

const HOW = ['seen', 'vented', 'dna', 'told'] as const;

const Draft = z.strictObject({
  what: z.enum(['sex', 'mark'], 'Choose what was found'),
  fishId: z.string('Choose which fish'),
  sex: z.enum(SEXES, 'Choose a sex'),
  how: z.enum(HOW, 'Choose how it was found'),
  certain: z.boolean('Say how sure'),
  /** Empty: it has none now. */
  mark: z.optional(z.string().check(z.maxLength(120, 'Keep it under 120 letters'))),
  onDay: DayText,
  note: NoteDraft,
});
type Draft = z.input<typeof Draft>;

/** What was found about a fish: its sex, or the mark it is known by. */
export function FindingForm(opened: Opened) {
  return (
    <WithFish title="Sex or mark" form="finding" {...opened}>
      {(here) => <Fields here={here} />}
    </WithFish>
  );
}

const contentOf = ({ what, fishId, onDay, note, sex, how, certain, mark }: z.output<typeof Draft>): EntryContent =>
  what === 'sex'
    ? { kind: 'sexSeen', fishId, onDay, sex, how, certain, note }
    : { kind: 'markSeen', fishId, onDay, mark: mark?.trim() || null, note };

function Fields({ here }: { here: FishHere }) {
  const { today } = useRoom();
  const start: Draft = {
    what: 'sex',
    fishId: here.chosen?.id ?? '',
    sex: here.chosen?.sex ?? 'female',
    how: 'seen',
    certain: true,
    mark: '',
    onDay: today,
    note: '',
  };
  const entry = useEntryForm({
    title: 'Sex or mark',
    draft: `finding:${here.tank?.id ?? here.chosen?.id}`,
    schema: Draft,
    start,
    content: contentOf,
  });
  const { what } = entry.form.values;
  return (
    <EntryPage entry={entry} subtitle={<FishLine here={here} />} saveLabel={what === 'sex' ? 'Save sex' : 'Save mark'}>
      <SegmentedField
        name="what"
        label="What was found"
        choices={[
          { value: 'sex', word: 'Sex' },
          { value: 'mark', word: 'Mark' },
        ]}
      />
      <WhichFish
        fish={here.fish}
        label="Which fish?"
        noteOf={({ mark }) => (what === 'mark' ? mark : null)}
        anonymous
      />
      {what === 'sex' ? (
        <>
          <SegmentedField
            name="sex"
            label="It is"
            choices={[
              { value: 'male', word: 'Male' },
              { value: 'female', word: 'Female' },
              { value: 'unknown', word: 'Can’t tell' },
            ]}
          />
          <SegmentedField
            name="how"
            label="How it was found"
            choices={[
              { value: 'seen', word: 'Seen' },
              { value: 'vented', word: 'Vented' },
              { value: 'dna', word: 'DNA' },
              { value: 'told', word: 'Told' },
            ]}
          />
          <CheckField name="certain" label="Certain" />
        </>
      ) : (
        <TextField name="mark" label="Mark" hint="A notch, a scar, a tag. Leave it empty when the mark is lost." />
      )}
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
