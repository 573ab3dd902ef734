import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { ChoiceCards } from '@/components/form/ChoiceCards';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, formatShortDay } from '@/shared/days';
import { HoldClash } from '@/shared/holds/contract';
import type { EntryContent } from '@/shared/record/kinds';
import type { Refusal } from '@/shared/refusal';
import { may } from '@/shared/roles';
import { type Around, type Begun, parentageOf } from './beginning';
import { ClashFacts } from './ClashFacts';
import { whoHolds } from './whoHolds';

type Settling = {
  clash: Refusal | null;
  settleClash: () => void;
  record: (content: EntryContent, to?: null) => Promise<void>;
};

const CHOICES = ['theirs', 'yours', 'other'] as const;
type Choice = (typeof CHOICES)[number];

/**
 * Two people recorded one mouth. Both records are shown; whichever is right, the other is kept beside it: as a check on the
 * hold that stands, or as the hold's history under a correction.
 */
export function useBeginClash(entry: Settling, mine: () => Begun | null, around: Around) {
  const room = useRoom();
  const [choice, setChoice] = useState<Choice>('theirs');
  const send = useMutation({ mutationFn: (content: EntryContent) => entry.record(content) });
  const parsed = entry.clash ? HoldClash.safeParse(entry.clash.current) : null;
  const value = entry.clash ? mine() : null;
  if (!parsed?.success || !value || parsed.data.hold.endedOn) return null;
  const theirs = parsed.data;
  const by = theirs.by ?? 'The import';
  const yours = { ...factsOf(value), sires: parentageOf(value, around).sires };
  const mayCorrect = may(room.role, 'entry:correct');
  const codes = new Map(around.proposal.sires.map(({ fishId, code }) => [fishId, code ?? 'not told apart']));
  const nameOf = (fishId: string | null) => (fishId ? (codes.get(fishId) ?? '?') : 'not known');
  const cards = [
    {
      value: 'theirs',
      title: by,
      aside: theirs.madeAt ? formatShortDay(dayOf(Date.parse(theirs.madeAt), room.timeZone)) : undefined,
      label: `${by}’s record`,
      children: (
        <ClashFacts spawn={theirs.hold} sires={theirs.sires.map(({ fishId }) => nameOf(fishId))} hold={theirs.hold} />
      ),
    },
    {
      value: 'yours',
      title: 'Yours',
      aside: 'now, on this device',
      label: 'Your record',
      children: <ClashFacts spawn={yours} sires={yours.sires.map(({ fishId }) => nameOf(fishId))} hold={theirs.hold} />,
    },
    { value: 'other', title: 'It was another female', label: 'It was another female' },
  ];
  const act = () => {
    if (choice === 'other') entry.settleClash();
    else send.mutate(choice === 'theirs' ? asCheck(theirs, value) : asCorrection(theirs, value, around, room.today));
  };
  return {
    fields: (
      <>
        <Notice
          tone="look"
          alert
          title={`Not saved yet. ${by} recorded this hold too.`}
          words={
            <Text size="small">
              <Code>{whoHolds(theirs.hold)}</Code> can have one hold at a time. Which record is right? Both stay in its
              history.
            </Text>
          }
        />
        <ChoiceCards
          label="Which record is right?"
          cards={cards.filter(({ value: of }) => of !== 'yours' || mayCorrect)}
          value={choice}
          onChange={(next) => setChoice(CHOICES.find((one) => one === next) ?? 'theirs')}
        />
        {send.error ? <Notice tone="act" alert words={send.error.message} /> : null}
      </>
    ),
    dock: <Button kind="primary" grow label={actWords(choice, by)} busy={send.isPending} onPress={act} />,
  };
}

function actWords(choice: Choice, by: string): string {
  if (choice === 'other') return 'Choose the female again';
  return choice === 'theirs' ? `Keep ${by}’s, yours as a check` : `Correct ${by}’s hold to yours`;
}

const factsOf = ({ notYetOn, firstSeenOn }: Begun) => ({
  spawnSeen: notYetOn === undefined,
  spawnEarliest: notYetOn ?? firstSeenOn,
  spawnLatest: firstSeenOn,
  firstSeenOn,
});

function asCheck({ hold }: HoldClash, value: Begun): EntryContent {
  const { spawnSeen, spawnEarliest, firstSeenOn } = factsOf(value);
  const said = spawnSeen
    ? `Spawn seen ${formatShortDay(firstSeenOn)} by me.`
    : `I saw her not holding ${formatShortDay(spawnEarliest)}, holding ${formatShortDay(firstSeenOn)}.`;
  return {
    kind: 'holdCheck',
    holdId: hold.id,
    onDay: [firstSeenOn, hold.spawnEarliest].sort().at(-1) ?? firstSeenOn,
    seen: 'holding',
    note: [said, value.note].filter(Boolean).join(' '),
  };
}

function asCorrection({ hold }: HoldClash, value: Begun, around: Around, today: string): EntryContent {
  const { spawnSeen, spawnEarliest, spawnLatest, firstSeenOn } = hold;
  const holderId = hold.holder?.id ?? null;
  return {
    kind: 'holdCorrected',
    holdId: hold.id,
    onDay: today,
    was: { holderId, spawnSeen, spawnEarliest, spawnLatest, firstSeenOn },
    now: { holderId, ...factsOf(value) },
    parentage: parentageOf(value, around),
    note: value.note,
  };
}
