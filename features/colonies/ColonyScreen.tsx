import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { ColonyList } from './ColonyList';
import { ColonyPage } from './ColonyPage';
import { colonyQuery } from './queries';

/** What other features show on a colony's page; set in by the route. */
export type ColonyParts = { photos: ReactNode; history: ReactNode };

export function ColoniesScreen() {
  return (
    <TwoPane
      list={<ColonyList />}
      detail={null}
      nothing={<EmptyState title="Choose a colony" words="Its fish, who holds, and its broods are shown here." />}
    />
  );
}

export function ColonyScreen({ colonyId, ...parts }: ColonyParts & { colonyId: string }) {
  return (
    <TwoPane
      list={<ColonyList chosen={colonyId} />}
      detail={<Detail key={colonyId} colonyId={colonyId} {...parts} />}
    />
  );
}

function Detail({ colonyId, ...parts }: ColonyParts & { colonyId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(colonyQuery(room.id, colonyId));
  if (data) return <ColonyPage told={data} {...parts} />;
  return (
    <Screen title="Colony" back={`/r/${room.id}/stock/colonies`}>
      {error ? (
        <ErrorState title="This colony could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the colony" />
      )}
    </Screen>
  );
}
