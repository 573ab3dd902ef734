import { useQuery } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { IconButton } from '@/components/ui/IconButton';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { SearchField } from '@/components/ui/SearchField';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { Filters, Toolbar } from '@/components/ui/Toolbar';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { byNumber } from '@/shared/codes';
import { EXIT_WORDS, type FishRow } from '@/shared/fish/contract';
import { may } from '@/shared/roles';
import { formatLength } from '@/shared/unitWords';
import { fishListQuery } from './queries';

const SHOWN = ['male', 'female', 'unknown', 'breeder', 'holdback', 'past'] as const;
type Shown = (typeof SHOWN)[number];
const WORDS: Record<Shown, string> = {
  male: 'Males',
  female: 'Females',
  unknown: 'Not sexed',
  breeder: 'Breeders',
  holdback: 'Holdbacks',
  past: 'Past ones too',
};

/** Every fish that has a code; anonymous ones are counted in their colonies. */
export function FishList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const [search, setSearch] = useUrlWord<string>('q', '');
  const [words, setWords] = useUrlWord<string>('show', '');
  const on = SHOWN.filter((word) => words.split(',').includes(word));
  const { data, error, refetch } = useQuery(fishListQuery(room.id, on.includes('past') ? 'all' : 'living'));
  const coded = data?.filter(({ code }) => code !== null) ?? [];
  const shown = coded
    .filter((fish) => suits(fish, on) && matches(fish, search))
    .sort((a, b) => byNumber(a.code ?? '', b.code ?? ''));
  const add = may(room.role, 'stock:write') ? (
    <IconButton icon="plus" label="Add fish" href={`/r/${room.id}/fish/new`} />
  ) : null;
  return (
    <Screen title="Fish" back={`/r/${room.id}/stock`} actions={add}>
      {!data ? (
        error ? (
          <ErrorState title="The fish could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading fish" />
        )
      ) : coded.length === 0 && on.length === 0 ? (
        <EmptyState
          title="No fish with codes yet"
          words="Founders, breeders and holdbacks have codes. Fry are counted in their broods."
        >
          {add ? <Button label="Add fish" href={`/r/${room.id}/fish/new`} /> : null}
        </EmptyState>
      ) : (
        <>
          <Toolbar>
            <SearchField value={search} onChange={setSearch} placeholder="Code, mark, tank, species" />
            <Filters
              label="Show"
              filters={SHOWN.map((value) => ({ value, word: WORDS[value] }))}
              on={on}
              onChange={(next) => setWords(next.join(','))}
            />
          </Toolbar>
          {shown.length === 0 ? (
            <EmptyState small title="No fish is like that" words="Change the search or the filters." />
          ) : null}
          <Rows bleed label="Fish">
            <VirtualList items={shown} keyOf={({ id }) => id}>
              {(fish) => <FishListRow fish={fish} selected={fish.id === chosen} />}
            </VirtualList>
          </Rows>
        </>
      )}
    </Screen>
  );
}

/** Sexes widen one another, and so do what they are kept as; the two kinds narrow each other. */
function suits({ sex, keptAs }: FishRow, on: readonly Shown[]): boolean {
  const sexes = on.filter((word) => word === 'male' || word === 'female' || word === 'unknown');
  const kept = on.filter((word) => word === 'breeder' || word === 'holdback');
  return (
    (sexes.length === 0 || sexes.some((word) => word === sex)) &&
    (kept.length === 0 || kept.some((word) => word === keptAs))
  );
}

const matches = ({ code, mark, tank, displayName, colony }: FishRow, search: string): boolean =>
  [code, mark, tank?.code, colony?.code, displayName].some((text) =>
    (text ?? '').toLowerCase().includes(search.trim().toLowerCase()),
  );

function FishListRow({ fish, selected }: { fish: FishRow; selected: boolean }) {
  const room = useRoom();
  const { id, code, sex, sexCertain, dominant, exit, displayName, tank, lastLengthTenthsMm, keptAs } = fish;
  const state = exit ? EXIT_WORDS[exit.kind] : dominant ? 'Dominant' : keptAs === 'holdback' ? 'Holdback' : null;
  return (
    <Row
      href={`/r/${room.id}/fish/${id}`}
      label={`${code}, ${sex === 'unknown' ? 'not sexed' : sex}${state ? `, ${state}` : ''}`}
      margin={<SexShape sex={sex} possible={!sexCertain && sex !== 'unknown'} />}
      selected={selected}
      title={<Code>{code ?? ''}</Code>}
      {...(state ? { state } : {})}
      note={
        <Text size="small" tone="soft" cut>
          {displayName ? <Text italic>{displayName}</Text> : 'No strain'}
          {tank ? ` · ${tank.code}` : ''}
          {lastLengthTenthsMm ? ` · ${formatLength(lastLengthTenthsMm, room.units)}` : ''}
        </Text>
      }
    />
  );
}
