import { useQuery } from '@tanstack/react-query';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { formatDate } from '@/shared/days';
import { ORDER_STATE_WORDS } from '@/shared/orders/state';
import { ownOrdersQuery } from './ownQueries';

/** Orders of the account's own address, in whatever fishroom. */
export function OwnOrdersScreen() {
  const { data, error, refetch } = useQuery(ownOrdersQuery());
  return (
    <Screen title="Your orders" measure>
      {!data ? (
        error ? (
          <ErrorState title="Your orders could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading your orders" />
        )
      ) : data.length === 0 ? (
        <EmptyState title="No orders" words="Orders made with your confirmed address stand here." />
      ) : (
        <Rows label="Your orders">
          {data.map(({ id, token, number, roomName, state, what, madeOn }) => (
            <Row
              key={id}
              href={`/order/${token}`}
              label={`Order ${number} at ${roomName}, ${ORDER_STATE_WORDS[state]}`}
              figure={String(number)}
              title={roomName}
              state={ORDER_STATE_WORDS[state]}
              note={`${what}, ${formatDate(madeOn)}`}
            />
          ))}
        </Rows>
      )}
    </Screen>
  );
}
