import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { TextField } from '@/components/form/TextField';
import { Text } from '@/components/ui/Text';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { type Day, DayText } from '@/shared/days';
import type { HoldRow } from '@/shared/holds/contract';
import { HoldLine } from './HoldLine';
import { type ModeWords, modeWords } from './modeWords';
import { useEndedClash } from './useEndedClash';
import { WithHold } from './WithHold';

const ENDS = ['swallowed', 'lost', 'diedHolding'] as const;
type End = (typeof ENDS)[number];
const Draft = z.strictObject({
  outcome: z.enum(ENDS, 'Choose how it ended'),
  onDay: DayText,
  note: NoteDraft,
});

const startOn = (today: Day): z.input<typeof Draft> => ({ outcome: 'swallowed', onDay: today, note: '' });

type Props = { holdId?: string | undefined; tankId?: string | undefined };

/** A hold that ends without fry. */
export function LostForm(props: Props) {
  return (
    <WithHold title="Swallowed or lost" form="swallowed" {...props}>
      {(hold) => <Fields key={hold.id} hold={hold} />}
    </WithHold>
  );
}

function Fields({ hold }: { hold: HoldRow }) {
  const room = useRoom();
  const words = modeWords(hold.mode);
  const entry = useEntryForm({
    title: `${words.ends.swallowed} or lost`,
    draft: `lost:${hold.id}`,
    schema: Draft,
    start: startOn(room.today),
    content: ({ outcome, onDay, note }) => ({ kind: 'holdEnded', holdId: hold.id, outcome, onDay, brood: null, note }),
    clashes: true,
  });
  return (
    <EntryPage
      entry={entry}
      subtitle={<HoldLine hold={hold} />}
      saveLabel="Save the end"
      clash={useEndedClash(entry.clash)}
    >
      <Part title="How did it end?">
        <SegmentedField
          name="outcome"
          label="How did it end?"
          quiet
          choices={ENDS.map((value) => ({ value, word: words.ends[value] }))}
        />
        <Text size="small" tone="soft" style={{ marginTop: 8 }}>
          {meaning(entry.form.values.outcome, words)}
        </Text>
      </Part>
      <Part title="Last day of it">
        <DateField
          name="onDay"
          label="Last day of it"
          quiet
          today={room.today}
          earliest={hold.spawnEarliest}
          hint={`Recorded by ${room.accountName}`}
        />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}

function meaning(outcome: End, { carer }: ModeWords): string {
  switch (outcome) {
    case 'swallowed':
      return 'The mouth was empty and no fry were found. It counts as swallowed in the review of females.';
    case 'lost':
      return 'Eggs or fry were lost, not swallowed: spat at the net, eaten by others, a failed move.';
    case 'diedHolding':
      return `The ${carer} died. The fish leaves its colony and tank with this.`;
  }
}
