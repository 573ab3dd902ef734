import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { PickField } from '@/components/form/PickGrid';
import { TextField } from '@/components/form/TextField';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { type Day, DayText } from '@/shared/days';
import type { HoldRow } from '@/shared/holds/contract';
import { CHECK_SEEN, CHECK_WORDS } from '@/shared/holds/entries';
import { HoldLine } from './HoldLine';
import { modeWords } from './modeWords';
import { useEndedClash } from './useEndedClash';
import { WithHold } from './WithHold';

const Draft = z.strictObject({ seen: z.enum(CHECK_SEEN, 'Choose what was seen'), onDay: DayText, note: NoteDraft });

const startOn = (today: Day): z.input<typeof Draft> => ({ seen: 'holding', onDay: today, note: '' });

type Props = { holdId?: string | undefined; tankId?: string | undefined };

/** A look at a female that holds. */
export function CheckForm(props: Props) {
  return (
    <WithHold title="Check" form="check" {...props}>
      {(hold) => <Fields key={hold.id} hold={hold} />}
    </WithHold>
  );
}

function Fields({ hold }: { hold: HoldRow }) {
  const room = useRoom();
  const entry = useEntryForm({
    title: 'Check',
    draft: `check:${hold.id}`,
    schema: Draft,
    start: startOn(room.today),
    content: ({ seen, onDay, note }) => ({ kind: 'holdCheck', holdId: hold.id, seen, onDay, note }),
    clashes: true,
  });
  const { seen } = entry.form.values;
  const to = `/r/${room.id}/record` as const;
  const words = modeWords(hold.mode);
  return (
    <EntryPage
      entry={entry}
      subtitle={<HoldLine hold={hold} />}
      saveLabel="Save check"
      clash={useEndedClash(entry.clash)}
    >
      <Part title="What was seen?">
        <PickField
          name="seen"
          label="What was seen?"
          picks={CHECK_SEEN.map((value) => ({ value, word: checkWord(value, hold) }))}
        />
      </Part>
      {seen === 'notHolding' ? (
        <Notice words="If it is over, say how it ended instead: the days stop there.">
          <Button label={words.ends.released} small href={`${to}/release?hold=${hold.id}`} />
          <Button label={`${words.ends.swallowed} or lost`} small href={`${to}/swallowed?hold=${hold.id}`} />
        </Notice>
      ) : null}
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={room.today} earliest={hold.spawnEarliest} />
      </Part>
      <View>
        <TextField name="note" label="Note" aside="not needed" long />
      </View>
    </EntryPage>
  );
}

/** Of guarded eggs there is no mouth to look into. */
function checkWord(seen: (typeof CHECK_SEEN)[number], { mode }: HoldRow): string {
  if (mode !== 'substrateSpawner') return CHECK_WORDS[seen];
  if (seen === 'holding') return 'Still guarding';
  return seen === 'notHolding' ? 'Not guarding' : CHECK_WORDS[seen];
}
