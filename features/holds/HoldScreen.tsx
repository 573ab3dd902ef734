import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { HoldListPane } from './HoldListPane';
import { HoldPage } from './HoldPage';
import { holdQuery } from './queries';

type Props = {
  holdId: string;
  /** What was recorded about it; another feature's. */
  history: ReactNode;
};

/** One hold: where it stands, what comes next, who the sires may be. */
export function HoldScreen({ holdId, history }: Props) {
  return (
    <TwoPane
      list={<HoldListPane selected={holdId} />}
      detail={<Detail key={holdId} holdId={holdId} history={history} />}
    />
  );
}

function Detail({ holdId, history }: Props) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(holdQuery(room.id, holdId));
  if (data) return <HoldPage told={data} history={history} />;
  return (
    <Screen title="Hold" back={`/r/${room.id}`}>
      {error ? (
        <ErrorState title="This hold could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the hold" />
      )}
    </Screen>
  );
}
