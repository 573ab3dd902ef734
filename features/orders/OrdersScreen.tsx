import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { OrderList } from './OrderList';
import { OrderPage } from './OrderPage';
import { orderQuery } from './queries';

export function OrdersScreen({ tabs }: { tabs: ReactNode }) {
  return (
    <TwoPane
      list={<OrderList tabs={tabs} />}
      detail={null}
      nothing={
        <EmptyState title="Choose an order" words="Its fish, its money, and what happens next are shown here." />
      }
    />
  );
}

export function OrderScreen({ orderId }: { orderId: string }) {
  return <TwoPane list={<OrderList chosen={orderId} />} detail={<Detail key={orderId} orderId={orderId} />} />;
}

function Detail({ orderId }: { orderId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(orderQuery(room.id, orderId));
  if (data) return <OrderPage told={data} />;
  return (
    <Screen title="Order" back={`/r/${room.id}/buyers/orders`}>
      {error ? (
        <ErrorState title="This order could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the order" />
      )}
    </Screen>
  );
}
