import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import type { RequestRow } from '@/shared/buyers/requests';
import { askedWords } from '@/shared/buyers/requestWords';
import { formatDay } from '@/shared/days';
import { BuyersTabs } from './BuyersTabs';
import { requestsQuery } from './queries';
import { canBeMet, isOpen, standsWords } from './requestFacts';

type Props = { kind: RequestRow['kind']; chosen?: string };

const WORDS = {
  fish: {
    title: 'Requests',
    none: 'Nobody asks',
    words: 'Who asks for fish on the public page stands here, in order.',
  },
  notice: {
    title: 'Waiting list',
    none: 'Nobody waits',
    words: 'Who wants to be told when a strain has reached a size stands here, in order.',
  },
} as const;

/** Requests in the order in which they came: those that are open, or all. */
export function RequestList({ kind, chosen }: Props) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(requestsQuery(room.id));
  const [show, setShow] = useUrlWord('show', 'open', ['open', 'all']);
  const own = data?.filter((one) => one.kind === kind) ?? [];
  const open = own.filter(isOpen);
  const shown = show === 'open' ? open : own;
  const { title, none, words } = WORDS[kind];
  return (
    <Screen title={title} fixed={<BuyersTabs value={kind === 'fish' ? 'requests' : 'waiting'} />}>
      {!data ? (
        error ? (
          <ErrorState title="The requests could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading requests" />
        )
      ) : (
        <>
          <View style={{ marginVertical: space[3] }}>
            <Segmented
              label="Which requests"
              as="tabs"
              choices={[
                { value: 'open', word: `Open ${open.length}` },
                { value: 'all', word: `All ${own.length}` },
              ]}
              value={show}
              onChange={setShow}
            />
          </View>
          {shown.length === 0 ? <EmptyState small title={none} words={words} /> : null}
          <Rows bleed label={title}>
            <VirtualList items={shown} keyOf={({ id }) => id}>
              {(request) => <RequestLine request={request} selected={request.id === chosen} />}
            </VirtualList>
          </Rows>
        </>
      )}
    </Screen>
  );
}

function RequestLine({ request, selected }: { request: RequestRow; selected: boolean }) {
  const room = useRoom();
  const { id, kind, buyer, madeOn, place } = request;
  const what = askedWords(kind, request, room.units);
  const stands = standsWords(request, room.today);
  return (
    <Row
      href={`/r/${room.id}/buyers/${kind === 'fish' ? 'requests' : 'waiting'}/${id}`}
      label={`${buyer.name}, ${what}, ${stands}`}
      selected={selected}
      figure={place === null ? '–' : String(place)}
      unit={place === null ? 'over' : 'in row'}
      title={buyer.name}
      state={
        <Text size="small" tone="soft">
          {formatDay(madeOn, room.today)}
        </Text>
      }
      note={what}
    >
      <Text size="small" strong={isOpen(request) && canBeMet(request)} tone={canBeMet(request) ? 'ink' : 'soft'}>
        {stands}
      </Text>
    </Row>
  );
}
