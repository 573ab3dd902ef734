import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { FishList } from './FishList';
import { FishPage } from './FishPage';
import { fishQuery } from './queries';

/** What other features show on a fish's page; set in by the route. */
export type FishParts = { photos: ReactNode; history: ReactNode; inbreeding: ReactNode };

export function FishesScreen() {
  return (
    <TwoPane
      list={<FishList />}
      detail={null}
      nothing={<EmptyState title="Choose a fish" words="Its sex, marks, holds and parents are shown here." />}
    />
  );
}

export function FishScreen({ fishId, ...parts }: FishParts & { fishId: string }) {
  return <TwoPane list={<FishList chosen={fishId} />} detail={<Detail key={fishId} fishId={fishId} {...parts} />} />;
}

function Detail({ fishId, ...parts }: FishParts & { fishId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(fishQuery(room.id, fishId));
  if (data) return <FishPage told={data} {...parts} />;
  return (
    <Screen title="Fish" back={`/r/${room.id}/stock/fish`}>
      {error ? (
        <ErrorState title="This fish could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the fish" />
      )}
    </Screen>
  );
}
