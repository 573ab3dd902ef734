import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { BroodList } from './BroodList';
import { BroodPage } from './BroodPage';
import { broodQuery } from './queries';

/** What other features show on a brood's page; set in by the route. */
export type BroodParts = { growth: ReactNode; photos: ReactNode; history: ReactNode; inbreeding: ReactNode };

/** The list alone on a phone; on a wide screen with a place for what is chosen. */
export function BroodsScreen() {
  return (
    <TwoPane
      list={<BroodList />}
      detail={null}
      nothing={<EmptyState title="Choose a brood" words="Its heads, growth and photos are shown here." />}
    />
  );
}

export function BroodScreen({ broodId, ...parts }: BroodParts & { broodId: string }) {
  return (
    <TwoPane list={<BroodList chosen={broodId} />} detail={<Detail key={broodId} broodId={broodId} {...parts} />} />
  );
}

function Detail({ broodId, ...parts }: BroodParts & { broodId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(broodQuery(room.id, broodId));
  if (data) return <BroodPage told={data} {...parts} />;
  return (
    <Screen title="Brood" back={`/r/${room.id}/stock/broods`}>
      {error ? (
        <ErrorState title="This brood could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the brood" />
      )}
    </Screen>
  );
}
