import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { TextField } from '@/components/form/TextField';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Screen } from '@/components/ui/Screen';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { FishCode } from '@/shared/codes';
import { DayText } from '@/shared/days';
import type { FishRow } from '@/shared/fish/contract';
import { FishLine } from './FishLine';
import { useFreeCode } from './queries';
import { WhichFish } from './WhichFish';
import { type FishHere, type Opened, WithFish } from './WithFish';

const Draft = z.strictObject({
  fishId: z.string('Choose which fish'),
  code: FishCode,
  mark: z.optional(z.string().check(z.maxLength(120, 'Keep it under 120 letters'))),
  onDay: DayText,
  note: NoteDraft,
});

/** An anonymous fish can be told from the others: it gets a code, and the mark it is known by. */
export function ToldApartForm(opened: Opened) {
  return (
    <WithFish title="Told apart" form="told-apart" {...opened}>
      {(here) => <Prepared here={here} />}
    </WithFish>
  );
}

function Prepared({ here }: { here: FishHere }) {
  const { id: roomId } = useRoom();
  const leave = useLeave();
  const anonymous = here.fish.filter(({ code }) => code === null);
  const [first] = anonymous;
  const stem = first?.colony?.code ?? first?.strainCode ?? null;
  const { data: code, error } = useFreeCode(stem);
  const close = { label: 'Close Told apart', onPress: () => leave() };
  if (!first) {
    return (
      <Screen title="Told apart" close={close} low measure>
        <EmptyState small title="All have codes" words="Every fish of this tank can be told from the others already.">
          <Button label="Sex or mark instead" small href={`/r/${roomId}/record/finding?tank=${here.tank?.id}`} />
        </EmptyState>
      </Screen>
    );
  }
  if (code === undefined && !error)
    return (
      <Screen title="Told apart" close={close} low measure>
        {null}
      </Screen>
    );
  return <Fields here={here} anonymous={anonymous} code={code ?? ''} />;
}

function Fields({ here, anonymous, code }: { here: FishHere; anonymous: FishRow[]; code: string }) {
  const { today } = useRoom();
  const [first] = anonymous;
  const one = here.chosen ?? (anonymous.every(({ sex }) => sex === first?.sex) ? first : undefined);
  const entry = useEntryForm({
    title: 'Told apart',
    draft: `toldApart:${here.tank?.id}`,
    schema: Draft,
    start: { fishId: one?.id ?? '', code, mark: '', onDay: today, note: '' },
    content: ({ fishId, code: given, mark, onDay, note }) => ({
      kind: 'toldApart',
      fishId,
      code: given,
      mark: mark?.trim() || null,
      onDay,
      note,
    }),
  });
  return (
    <EntryPage entry={entry} subtitle={<FishLine here={here} />} saveLabel="Save code">
      <WhichFish fish={anonymous} label="One of which?" anonymous />
      <TextField name="code" label="Code" mono autoCapitalize="characters" />
      <TextField name="mark" label="Known by" aside="not needed" hint="A notch, a scar, a tag." />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
