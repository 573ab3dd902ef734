import { useMutation, useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import { ChoiceCards } from '@/components/form/ChoiceCards';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId, useQueue } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { readBrood } from '@/shared/broods/contract';
import type { HoldRow } from '@/shared/holds/contract';
import { undoEntry } from '@/shared/record/contract';
import { may } from '@/shared/roles';
import { type Side, sidesOf } from './conflictSides';
import { followersOf } from './following';
import { queue } from './queue';
import { titleOf } from './saying';
import { choicesOf, holdClashIn } from './settling';
import { useCodes } from './useCodes';
import type { Waiting } from './waiting';

type Facts = (facts: {
  spawn: { spawnSeen: boolean; spawnEarliest: string; spawnLatest: string };
  sires: string[];
  hold: HoldRow;
}) => ReactNode;

type Props = {
  entryId: string;
  /** How the holds' own pages show one of two records of a hold; set in by the route. */
  holdFacts: Facts;
};

/** Two records of one thing, side by side: which is right? Nothing is dropped; the other stays in the history. */
export function ConflictScreen({ entryId, holdFacts }: Props) {
  const room = useRoom();
  const { entries } = useQueue();
  const entry = entries.find(({ id }) => id === entryId);
  const back = `/r/${room.id}/waiting` as const;
  if (!entry?.trouble) {
    return (
      <Screen title="Two records" back={back} measure>
        <EmptyState title="Nothing to choose here" words="This record has gone up, or was changed meanwhile." />
      </Screen>
    );
  }
  return <Choosing entry={entry} back={back} holdFacts={holdFacts} />;
}

type ChoosingProps = { entry: Waiting; back: `/r/${string}/waiting`; holdFacts: Facts };

function Choosing({ entry, back, holdFacts }: ChoosingProps) {
  const room = useRoom();
  const router = useRouter();
  const { entries } = useQueue();
  const codeOf = useCodes(entries);
  const [choice, setChoice] = useState<'theirs' | 'yours'>('theirs');
  const [spare] = useState(newId);
  const clash = holdClashIn(entry);
  const theirBatchId = useTheirBatch(clash?.hold.brood?.id ?? null);
  const known = { today: room.today, mayCorrect: may(room.role, 'entry:correct'), theirBatchId, newId: spare };
  const choices = choicesOf(entry, known);
  const settle = useMutation({
    mutationFn: async () => {
      const chosen = choice === 'yours' ? choices?.yours : choices?.theirs;
      if (!chosen) return;
      if (chosen.undoFirst) await call(undoEntry, { params: { roomId: room.id, entryId: chosen.undoFirst } });
      await queue.resolve(entry.id, chosen);
      router.replace(back);
    },
  });
  const sides = sidesOf(entry, { room, codeOf });
  const following = followersOf(entry, entries);
  const cards = [cardOf('theirs', sides.theirs, holdFacts), cardOf('yours', sides.yours, holdFacts)];
  const words = choice === 'theirs' ? sides.theirs.keep : sides.yours.keep;
  return (
    <Screen
      title={titleOf(entry.content)}
      back={back}
      dock={<Button kind="primary" grow label={words} busy={settle.isPending} onPress={() => settle.mutate()} />}
      measure
    >
      <View style={{ gap: space[4] }}>
        <Notice
          tone="look"
          alert
          title={`Not saved yet. ${sides.theirs.title} recorded this too.`}
          words={sides.words}
        />
        <ChoiceCards
          label="Which record is right?"
          cards={cards.filter(({ value }) => value === 'theirs' || choices?.yours)}
          value={choice}
          onChange={(next) => setChoice(next === 'yours' ? 'yours' : 'theirs')}
        />
        {following.length > 0 ? (
          <Text size="small" tone="soft">
            {`What you recorded on top of it goes along: ${following.map(({ content }) => titleOf(content)).join(', ')}.`}
          </Text>
        ) : null}
        {settle.error ? <Notice tone="act" alert words={settle.error.message} /> : null}
      </View>
    </Screen>
  );
}

function cardOf(value: 'theirs' | 'yours', { title, aside, lines, spawn }: Side, holdFacts: Facts) {
  return {
    value,
    title,
    ...(aside ? { aside } : {}),
    label: `${title}: ${lines.join(', ')}`,
    children: (
      <>
        {spawn ? holdFacts(spawn) : null}
        {lines.map((line) => (
          <Text key={line}>{line}</Text>
        ))}
      </>
    ),
  };
}

/** Where the other's brood lives: what was recorded on top of one's own strip goes there. */
function useTheirBatch(broodId: string | null): string | null {
  const { id: roomId } = useRoom();
  const { data } = useQuery({
    queryKey: [roomId, 'queue', 'brood', broodId],
    queryFn: ({ signal }) => call(readBrood, { params: { roomId, broodId: broodId ?? '' }, signal }),
    enabled: broodId !== null,
  });
  return data?.batches[0]?.id ?? null;
}
