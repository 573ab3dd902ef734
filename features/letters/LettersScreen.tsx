import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { VirtualList } from '@/components/ui/VirtualList';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { type LetterRow, listLetters, sendLetterAgain } from '@/shared/letters/contract';

const lettersQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'letters'],
    queryFn: ({ signal }) => call(listLetters, { params: { roomId }, signal }),
    select: ({ letters }) => letters,
  });

/** Every letter of the fishroom; those that were not taken stand first and can be sent again. */
export function LettersScreen() {
  const room = useRoom();
  const cache = useQueryClient();
  const { data, error, refetch } = useQuery(lettersQuery(room.id));
  const again = useMutation({
    mutationFn: (letterId: string) => call(sendLetterAgain, { params: { roomId: room.id, letterId }, body: {} }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [room.id] }),
  });
  const sorted = data?.toSorted((a, b) => Number(b.state === 'failed') - Number(a.state === 'failed'));
  return (
    <Screen title="Letters" back={`/r/${room.id}/settings`} measure>
      {again.error ? <Notice tone="look" alert words={again.error.message} /> : null}
      {!sorted ? (
        error ? (
          <ErrorState title="The letters could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading the letters" />
        )
      ) : sorted.length === 0 ? (
        <EmptyState
          title="No letter yet"
          words="Letters to buyers stand here: what was sent, and what was not taken."
        />
      ) : (
        <Rows label="Letters">
          <VirtualList items={sorted} keyOf={({ id }) => id}>
            {(letter) => <LetterLine letter={letter} onAgain={() => again.mutate(letter.id)} />}
          </VirtualList>
        </Rows>
      )}
    </Screen>
  );
}

function LetterLine({ letter, onAgain }: { letter: LetterRow; onAgain: () => void }) {
  const { today } = useRoom();
  const { subject, to, state, at, sentAt, lastError, attempts } = letter;
  const when = `${to}, ${formatDay((sentAt ?? at).slice(0, 10), today)}`;
  return (
    <Row
      title={subject}
      state={
        state === 'failed' ? (
          <Text size="small" tone="trouble">
            Not sent
          </Text>
        ) : state === 'waiting' ? (
          'Waiting'
        ) : (
          'Sent'
        )
      }
      note={lastError ? `${when}. Tried ${attempts} times: ${lastError}` : when}
      action={
        state === 'failed' ? (
          <Button kind="text" small label="Send again" describe={`Send again: ${subject}`} onPress={onAgain} />
        ) : undefined
      }
    />
  );
}
