import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { LinkRow } from '@/components/ui/LinkRow';
import { Loading } from '@/components/ui/Loading';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { SearchLink } from '@/components/ui/SearchLink';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import type { Stock } from './finding';
import { stockQuery } from './queries';

/** What lives here, by kind, and the way to the search over everything. */
export function StockScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(stockQuery(room.id));
  return (
    <Screen title="Stock" measure>
      {data ? (
        isEmpty(data) ? (
          <Beginning />
        ) : (
          <View style={{ gap: space[4] }}>
            <SearchLink href={`/r/${room.id}/search`} words="Fish, brood, tank, order" />
            <Kinds stock={data} />
          </View>
        )
      ) : error ? (
        <ErrorState title="The stock could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the stock" />
      )}
    </Screen>
  );
}

const isEmpty = (stock: Stock): boolean => stock.strains.length + stock.tanks.length + stock.fish.length === 0;

/** The first three steps of a new fishroom, in the order in which they need one another. */
function Beginning() {
  const room = useRoom();
  const home = `/r/${room.id}` as const;
  return (
    <EmptyState
      title="Nothing lives here yet"
      words="First a tank, then a strain (a species from one place), then the colony that lives in the tank."
    >
      {may(room.role, 'stock:write') ? (
        <>
          <Button kind="primary" label="Add a tank" href={`${home}/tanks/new`} />
          <Button label="Add a strain" href={`${home}/strains/new`} />
        </>
      ) : null}
    </EmptyState>
  );
}

function Kinds({ stock }: { stock: Stock }) {
  const { id: roomId } = useRoom();
  const home = `/r/${roomId}` as const;
  const { colonies, broods, tanks, fish, strains } = stock;
  const heads = Math.round(broods.reduce((sum, brood) => sum + brood.heads, 0));
  const holding = colonies.reduce((sum, { openHolds }) => sum + openHolds, 0);
  const empty = tanks.filter(({ residents }) => residents.length === 0).length;
  return (
    <Rows>
      <LinkRow
        title="Colonies"
        value={String(colonies.length)}
        note={holding > 0 ? `${holding} holding` : 'nobody holds'}
        href={`${home}/stock/colonies`}
      />
      <LinkRow title="Broods" value={String(broods.length)} note={`${heads} heads`} href={`${home}/stock/broods`} />
      <LinkRow
        title="Tanks"
        value={String(tanks.length)}
        note={empty > 0 ? `${empty} empty` : 'all in use'}
        href={`${home}/stock/tanks`}
      />
      <LinkRow title="Fish with codes" value={String(fish.length)} href={`${home}/stock/fish`} />
      <LinkRow title="Strains" value={String(strains.length)} href={`${home}/stock/strains`} />
      <LinkRow title="Species" note="The library, and your own figures" href={`${home}/species`} />
    </Rows>
  );
}
