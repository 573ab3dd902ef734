import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { tankQuery } from './queries';
import { TankList } from './TankList';
import { TankPage } from './TankPage';

/** What other features show on a tank's page; set in by the route. */
export type TankParts = { photos: ReactNode; history: ReactNode };

export function TanksScreen() {
  return (
    <TwoPane
      list={<TankList />}
      detail={null}
      nothing={<EmptyState title="Choose a tank" words="Its water, who lives in it, and its log are shown here." />}
    />
  );
}

export function TankScreen({ tankId, ...parts }: TankParts & { tankId: string }) {
  return <TwoPane list={<TankList chosen={tankId} />} detail={<Detail key={tankId} tankId={tankId} {...parts} />} />;
}

function Detail({ tankId, ...parts }: TankParts & { tankId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(tankQuery(room.id, tankId));
  if (data) return <TankPage told={data} {...parts} />;
  return (
    <Screen title="Tank" back={`/r/${room.id}/stock/tanks`}>
      {error ? (
        <ErrorState title="This tank could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the tank" />
      )}
    </Screen>
  );
}
