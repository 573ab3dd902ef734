import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { DateField } from '@/components/form/DateField';
import { TextField } from '@/components/form/TextField';
import { Loading } from '@/components/ui/Loading';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { DayText } from '@/shared/days';
import type { HoldRow } from '@/shared/holds/contract';
import { CANNOT_TELL, type Proposal } from './beginning';
import { HoldLine } from './HoldLine';
import { HoldPreview } from './HoldPreview';
import { modeWords } from './modeWords';
import { useProposal } from './queries';
import { useEndedClash } from './useEndedClash';
import { WhichHolds } from './WhichHolds';
import { WithHold } from './WithHold';

const Draft = z
  .strictObject({
    holderId: z.string('Choose which, or that you can’t tell'),
    spawnSeen: z.boolean('Say yes or no'),
    spawnEarliest: DayText,
    firstSeenOn: DayText,
    note: NoteDraft,
  })
  .check(
    z.refine(({ spawnSeen, spawnEarliest, firstSeenOn }) => spawnSeen || spawnEarliest <= firstSeenOn, {
      error: 'Not after the day she was first seen holding',
      path: ['spawnEarliest'],
    }),
  );

/** A hold that goes on is set right: its days, or the female once she can be told. The first record stays in its history. */
export function CorrectionForm({ holdId }: { holdId?: string | undefined }) {
  return (
    <WithHold title="Correct the hold" form="hold-correction" holdId={holdId}>
      {(hold) => <Prepared key={hold.id} hold={hold} />}
    </WithHold>
  );
}

function Prepared({ hold }: { hold: HoldRow }) {
  const { data } = useProposal(hold.tank.id, hold.spawnEarliest, hold.spawnLatest);
  return data ? <Fields hold={hold} proposal={withHerself(data, hold)} /> : <Loading label="Loading the tank" />;
}

/** She holds already, by this very record: she can be chosen all the same. */
const withHerself = (proposal: Proposal, hold: HoldRow): Proposal => ({
  ...proposal,
  females: proposal.females.map((fish) => (fish.openHoldId === hold.id ? { ...fish, openHoldId: null } : fish)),
  sires: proposal.sires.map((fish) => (fish.openHoldId === hold.id ? { ...fish, openHoldId: null } : fish)),
});

function Fields({ hold, proposal }: { hold: HoldRow; proposal: Proposal }) {
  const room = useRoom();
  const words = modeWords(hold.mode);
  const { spawnSeen, spawnEarliest, spawnLatest, firstSeenOn } = hold;
  const was = { holderId: hold.holder?.id ?? null, spawnSeen, spawnEarliest, spawnLatest, firstSeenOn };
  const start: z.input<typeof Draft> = {
    holderId: was.holderId ?? CANNOT_TELL,
    spawnSeen,
    spawnEarliest,
    firstSeenOn,
    note: '',
  };
  const entry = useEntryForm({
    title: 'Correct the hold',
    draft: `correction:${hold.id}`,
    schema: Draft,
    start,
    content: ({ holderId, note, ...days }) => ({
      kind: 'holdCorrected',
      holdId: hold.id,
      onDay: room.today,
      was,
      now: { holderId: holderId === CANNOT_TELL ? null : holderId, ...factsOf(days) },
      parentage: null,
      note,
    }),
    clashes: true,
  });
  const { values } = entry.form;
  const now = factsOf(values);
  return (
    <EntryPage
      entry={entry}
      subtitle={<HoldLine hold={hold} />}
      saveLabel="Save the correction"
      clash={useEndedClash(entry.clash)}
    >
      <WhichHolds proposal={proposal} words={words} />
      <Part title="When she spawned">
        <CheckField name="spawnSeen" label="The spawn was seen" />
      </Part>
      {values.spawnSeen ? null : (
        <Part title={words.notYet}>
          <DateField name="spawnEarliest" label={words.notYet} quiet today={room.today} latest={values.firstSeenOn} />
        </Part>
      )}
      <Part title={values.spawnSeen ? 'Spawned on' : words.first}>
        <DateField name="firstSeenOn" label={values.spawnSeen ? 'Spawned on' : words.first} quiet today={room.today} />
      </Part>
      {now.spawnEarliest <= now.spawnLatest ? <HoldPreview facts={hold.clock} spawn={now} plan={hold.plan} /> : null}
      <TextField name="note" label="Why" aside="not needed" long />
    </EntryPage>
  );
}

const factsOf = ({
  spawnSeen,
  spawnEarliest,
  firstSeenOn,
}: {
  spawnSeen: boolean;
  spawnEarliest: string;
  firstSeenOn: string;
}) => ({ spawnSeen, spawnEarliest: spawnSeen ? firstSeenOn : spawnEarliest, spawnLatest: firstSeenOn, firstSeenOn });
