import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { type ReactNode, useRef } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { EmptyState } from '@/components/ui/EmptyState';
import { elementOf } from '@/components/ui/elementOf';
import { Loading } from '@/components/ui/Loading';
import { moveFocus } from '@/components/ui/moveFocus';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { SearchField } from '@/components/ui/SearchField';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { Unreachable } from '@/features/call';
import { openedPages } from '@/features/call/openedPages';
import { usePaused } from '@/hooks/usePaused';
import { useRoom } from '@/hooks/useRoom';
import { useSearchWord } from '@/hooks/useSearchWord';
import { type Found, MOST_FOUND } from '@/shared/search/contract';
import { FoundRows, hrefOf } from './FoundRows';
import { openedQuery, searchQuery } from './queries';

const PAUSE_MS = 150;

type Props = {
  /** Found without a signal in what this device has seen; another feature's, set in by the route. */
  unsignalled: (search: string) => ReactNode;
};

/** Everything in the fishroom by code or name. Arrow keys walk the list, Enter opens. */
export function SearchScreen({ unsignalled }: Props) {
  const room = useRoom();
  const router = useRouter();
  const box = useRef<View>(null);
  const [typed, setTyped] = useSearchWord('q');
  const wanted = usePaused(typed.trim(), PAUSE_MS);
  const search = useQuery(searchQuery(room.id, wanted));
  const first = typed.trim() === wanted ? search.data?.found[0] : undefined;
  const toFirst = () => elementOf(box.current)?.querySelector<HTMLElement>('a')?.focus();
  return (
    <Screen title="Search" back={`/r/${room.id}`} measure>
      <View ref={box} onKeyDown={(event) => moveFocus(event, 'input[type=search], a', { upDown: true })}>
        <View style={{ marginVertical: space[3] }}>
          <SearchField
            value={typed}
            onChange={setTyped}
            placeholder="Fish, brood, tank, order"
            autoFocus
            onDown={toFirst}
            onSubmit={() => first && router.push(hrefOf(room.id, first))}
          />
        </View>
        {wanted === '' ? <Opened /> : <Results search={search} wanted={wanted} unsignalled={unsignalled} />}
      </View>
    </Screen>
  );
}

type ResultsProps = Props & {
  search: { data: { found: Found[] } | undefined; error: Error | null };
  wanted: string;
};

function Results({ search: { data, error }, wanted, unsignalled }: ResultsProps) {
  if (error instanceof Unreachable)
    return (
      <>
        <Notice words="No signal: searched is what this device has seen of the stock." />
        {unsignalled(wanted)}
      </>
    );
  if (error) return <Notice tone="act" alert words={error.message} />;
  if (!data) return <Loading label="Searching" rows={3} />;
  const { found } = data;
  if (found.length === 0)
    return <EmptyState small title="Nothing is called that" words="Type the beginning of a code, a name or a mark." />;
  return (
    <>
      <FoundRows found={found} label="Found" />
      {found.length === MOST_FOUND ? (
        <Text size="small" tone="soft" style={{ marginTop: space[3] }}>
          {`The first ${MOST_FOUND}. Type more to narrow them down.`}
        </Text>
      ) : null}
    </>
  );
}

/** Before anything is typed: what was opened lately on this device. */
function Opened() {
  const room = useRoom();
  const pages = openedPages(room);
  const { data } = useQuery(openedQuery(room.id, pages));
  if (!data || data.found.length === 0)
    return <Text tone="soft">Codes, names, marks and numbers: the beginning is enough.</Text>;
  return (
    <Section title="Opened lately" aside="on this device">
      <FoundRows found={data.found} label="Opened lately" />
    </Section>
  );
}
