import { useMutation } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { HoldClash } from '@/shared/holds/contract';
import type { EntryContent } from '@/shared/record/kinds';
import type { Refusal } from '@/shared/refusal';
import { type Ending, numbersOf } from './ending';
import { useEndedClash } from './useEndedClash';

type Settling = { clash: Refusal | null; record: (content: EntryContent, to?: null) => Promise<void> };

/** Someone else stripped her already: their brood stands, and these numbers can be added to it as a count. */
export function useEndClash(entry: Settling, mine: () => Ending | null) {
  const room = useRoom();
  const ended = useEndedClash(entry.clash);
  const send = useMutation({ mutationFn: (content: EntryContent) => entry.record(content) });
  if (!ended) return null;
  const { hold } = HoldClash.parse(entry.clash?.current);
  const value = mine();
  const counted = value && Object.values(numbersOf(value)).some((number) => number !== null);
  const { brood } = hold;
  if (!value || !counted || !brood) return ended;
  const add = () =>
    send.mutate({
      kind: 'stageCount',
      broodId: brood.id,
      onDay: value.onDay,
      numbers: numbersOf(value),
      note: value.note,
    });
  return {
    fields: (
      <>
        {ended.fields}
        {send.error ? <Notice tone="act" alert words={send.error.message} /> : null}
      </>
    ),
    dock: (
      <View style={{ gap: space[1] }}>
        <Button kind="primary" grow label={`Add my count to ${brood.code}`} busy={send.isPending} onPress={add} />
        <TextLink label="Open the hold" href={`/r/${room.id}/holds/${hold.id}`} />
      </View>
    ),
  };
}
