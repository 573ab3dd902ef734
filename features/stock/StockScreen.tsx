import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Icon } from '@/components/ui/Icon';
import { LinkRow } from '@/components/ui/LinkRow';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { SearchField } from '@/components/ui/SearchField';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { may } from '@/shared/roles';
import { type Found, foundIn, type Stock } from './finding';
import { stockQuery } from './queries';

/** What lives here, by kind, and one search over all of it. */
export function StockScreen() {
  const room = useRoom();
  const [search, setSearch] = useUrlWord<string>('q', '');
  const { data, error, refetch } = useQuery(stockQuery(room.id));
  return (
    <Screen title="Stock" measure>
      {data ? (
        isEmpty(data) ? (
          <Beginning />
        ) : (
          <View style={{ gap: space[4] }}>
            <SearchField value={search} onChange={setSearch} placeholder="Any code, mark, tank or species" />
            {search.trim() ? <FoundRows found={foundIn(data, search)} /> : <Kinds stock={data} />}
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

const MOST = 40;
const KIND_WORDS: Record<Found['kind'], string> = {
  colonies: 'colony',
  broods: 'brood',
  tanks: 'tank',
  fish: 'fish',
  strains: 'strain',
};

function FoundRows({ found }: { found: Found[] }) {
  const { id: roomId } = useRoom();
  if (found.length === 0) return <EmptyState small title="Nothing is called that" words="Search for part of a code." />;
  return (
    <Rows label="Found">
      {found.slice(0, MOST).map(({ kind, id, code, note }) => (
        <Row
          key={id}
          href={`/r/${roomId}/${kind}/${id}`}
          label={`${code}, ${KIND_WORDS[kind]}`}
          title={<Code>{code}</Code>}
          {...(note ? { note } : {})}
          trailing={KIND_WORDS[kind]}
          end={<Icon name="next" tone="soft" />}
          middle
        />
      ))}
    </Rows>
  );
}
