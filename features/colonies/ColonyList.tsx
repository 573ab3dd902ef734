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
import { Text } from '@/components/ui/Text';
import { Toolbar } from '@/components/ui/Toolbar';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import type { ColonyRow } from '@/shared/colonies/contract';
import { may } from '@/shared/roles';
import { coloniesQuery } from './queries';

/** Every colony with its fish in the margin and who holds at its right. */
export function ColonyList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(coloniesQuery(room.id));
  const [search, setSearch] = useUrlWord<string>('q', '');
  const colonies = data?.filter(({ endedOn }) => endedOn === null) ?? [];
  const shown = colonies.filter((colony) => matches(colony, search));
  const add = may(room.role, 'stock:write') ? (
    <IconButton icon="plus" label="Add a colony" href={`/r/${room.id}/colonies/new`} />
  ) : null;
  return (
    <Screen title="Colonies" back={`/r/${room.id}/stock`} actions={add}>
      {!data ? (
        error ? (
          <ErrorState title="The colonies could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading colonies" />
        )
      ) : colonies.length === 0 ? (
        <EmptyState
          title="No colonies yet"
          words="A colony is a group that lives and breeds together: males and females of one strain, in one tank."
        >
          {add ? <Button label="Add a colony" href={`/r/${room.id}/colonies/new`} /> : null}
        </EmptyState>
      ) : (
        <>
          {colonies.length > 8 ? (
            <Toolbar>
              <SearchField value={search} onChange={setSearch} placeholder="Colony, tank, species" />
            </Toolbar>
          ) : null}
          {shown.length === 0 ? <EmptyState small title="No colony is like that" words="Change the search." /> : null}
          <Rows bleed label="Colonies">
            {shown.map((colony) => (
              <ColonyListRow key={colony.id} colony={colony} selected={colony.id === chosen} />
            ))}
          </Rows>
        </>
      )}
    </Screen>
  );
}

const matches = ({ code, displayName, locality, tank }: ColonyRow, search: string): boolean =>
  [code, displayName, locality ?? '', tank?.code ?? ''].some((text) =>
    text.toLowerCase().includes(search.trim().toLowerCase()),
  );

function ColonyListRow({ colony, selected }: { colony: ColonyRow; selected: boolean }) {
  const room = useRoom();
  const { id, code, displayName, locality, tank, males, females, unsexed, openHolds } = colony;
  const fish = males + females + unsexed;
  return (
    <Row
      href={`/r/${room.id}/colonies/${id}`}
      label={`${code}, ${fish} fish${openHolds > 0 ? `, ${openHolds} holding` : ''}`}
      figure={String(fish)}
      unit="fish"
      selected={selected}
      title={<Code>{code}</Code>}
      {...(openHolds > 0 ? { state: `${openHolds} holding` } : {})}
      note={
        <Text size="small" tone="soft" cut>
          <Text italic>{displayName}</Text>
          {locality ? ` ${locality}` : ''}
          {tank ? ` · ${tank.code}` : ' · in no tank'}
        </Text>
      }
    />
  );
}
