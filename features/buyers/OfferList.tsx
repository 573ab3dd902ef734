import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import type { listOffers } from '@/shared/buyers/offers';
import { may } from '@/shared/roles';
import { BuyersTabs } from './BuyersTabs';
import { OfferRow } from './OfferRow';
import { offersQuery } from './queries';

/** Every brood with fish: those on the public page, and those that are not. */
export function OfferList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(offersQuery(room.id));
  return (
    <Screen title="Availability" fixed={<BuyersTabs value="availability" />}>
      {data ? (
        <Offers told={data} chosen={chosen} />
      ) : error ? (
        <ErrorState
          title="What is available could not be loaded"
          words={error.message}
          onRetry={() => void refetch()}
        />
      ) : (
        <Loading label="Loading what is available" />
      )}
    </Screen>
  );
}

type Told = z.output<typeof listOffers.output>;

function Offers({ told, chosen }: { told: Told; chosen: string | undefined }) {
  const room = useRoom();
  const home = `/r/${room.id}/buyers/availability` as const;
  const listed = told.offers.filter(({ listing }) => listing?.listed);
  const rest = told.offers.filter(({ listing }) => !listing?.listed);
  if (told.offers.length === 0)
    return <EmptyState title="No fish to sell yet" words="A brood stands here from the day its fry swim free." />;
  return (
    <>
      {may(room.role, 'money:see') ? (
        <View style={{ paddingVertical: space[3] }}>
          <ButtonRow>
            <Button small grow icon="print" label="Price list" href={`${home}/prices`} />
            <Button small grow label="Public page" href={`${home}/page`} />
          </ButtonRow>
        </View>
      ) : null}
      <Section title="On the public page" aside={listed.length === 0 ? 'none' : String(listed.length)}>
        <Rows bleed label="On the public page">
          <VirtualList items={listed} keyOf={({ broodId }) => broodId}>
            {(offer) => <OfferRow offer={offer} selected={offer.broodId === chosen} />}
          </VirtualList>
        </Rows>
      </Section>
      {rest.length > 0 ? (
        <Section title="Not listed" aside={String(rest.length)}>
          <Rows bleed label="Not listed">
            <VirtualList items={rest} keyOf={({ broodId }) => broodId}>
              {(offer) => <OfferRow offer={offer} selected={offer.broodId === chosen} />}
            </VirtualList>
          </Rows>
        </Section>
      ) : null}
    </>
  );
}
