import { useQuery } from '@tanstack/react-query';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { OfferList } from './OfferList';
import { OfferPage } from './OfferPage';
import { offersQuery } from './queries';

export function AvailabilityScreen() {
  return (
    <TwoPane
      list={<OfferList />}
      detail={null}
      nothing={
        <EmptyState title="Choose a brood" words="How many are available, how long they are, and what they cost." />
      }
    />
  );
}

export function OfferScreen({ broodId }: { broodId: string }) {
  return <TwoPane list={<OfferList chosen={broodId} />} detail={<Detail key={broodId} broodId={broodId} />} />;
}

function Detail({ broodId }: { broodId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(offersQuery(room.id));
  const offer = data?.offers.find((one) => one.broodId === broodId);
  if (offer) return <OfferPage offer={offer} />;
  return (
    <Screen title="Availability" back={`/r/${room.id}/buyers/availability`}>
      {data ? (
        <EmptyState title="None of this brood is here" words="It has no fish any more, and nothing is said of it." />
      ) : error ? (
        <ErrorState title="This brood could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the brood" />
      )}
    </Screen>
  );
}
