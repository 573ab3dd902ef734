import { useQuery } from '@tanstack/react-query';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import type { RequestRow } from '@/shared/buyers/requests';
import { requestsQuery } from './queries';
import { RequestList } from './RequestList';
import { RequestPage } from './RequestPage';

type Kind = RequestRow['kind'];

const NOTHING: Record<Kind, { title: string; words: string }> = {
  fish: { title: 'Choose a request', words: 'Who asks for which fish, and whether they are there.' },
  notice: { title: 'Choose somebody who waits', words: 'For which strain, at what size, and whether it is reached.' },
};

/** What visitors of the public page ask for: fish, or to be told when a strain is large enough. */
export function RequestsScreen({ kind }: { kind: Kind }) {
  return <TwoPane list={<RequestList kind={kind} />} detail={null} nothing={<EmptyState {...NOTHING[kind]} />} />;
}

export function RequestScreen({ kind, requestId }: { kind: Kind; requestId: string }) {
  return (
    <TwoPane
      list={<RequestList kind={kind} chosen={requestId} />}
      detail={<Detail key={requestId} kind={kind} requestId={requestId} />}
    />
  );
}

function Detail({ kind, requestId }: { kind: Kind; requestId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(requestsQuery(room.id));
  const request = data?.find(({ id }) => id === requestId);
  const back = `/r/${room.id}/buyers/${kind === 'fish' ? 'requests' : 'waiting'}` as const;
  if (request) return <RequestPage request={request} back={back} />;
  return (
    <Screen title="Request" back={back}>
      {data ? (
        <EmptyState title="There is no such request" words="It may have been erased with its buyer." />
      ) : error ? (
        <ErrorState title="This request could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the request" />
      )}
    </Screen>
  );
}
