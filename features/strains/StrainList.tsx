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
import { may } from '@/shared/roles';
import type { StrainRow } from '@/shared/strains/contract';
import { strainsQuery } from './queries';

/** Species from one place each, with how many of them live here. */
export function StrainList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(strainsQuery(room.id));
  const [search, setSearch] = useUrlWord<string>('q', '');
  const add = may(room.role, 'stock:write') ? (
    <IconButton icon="plus" label="Add a strain" href={`/r/${room.id}/strains/new`} />
  ) : null;
  const shown = data?.filter((strain) => matches(strain, search)) ?? [];
  return (
    <Screen title="Strains" back={`/r/${room.id}/stock`} actions={add}>
      {!data ? (
        error ? (
          <ErrorState title="The strains could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading strains" />
        )
      ) : data.length === 0 ? (
        <EmptyState
          title="No strains yet"
          words="A strain is a species from one place: colonies and fish belong to it."
        >
          {add ? <Button label="Add a strain" href={`/r/${room.id}/strains/new`} /> : null}
        </EmptyState>
      ) : (
        <>
          {data.length > 8 ? (
            <Toolbar>
              <SearchField value={search} onChange={setSearch} placeholder="Species, locality, code" />
            </Toolbar>
          ) : null}
          {shown.length === 0 ? <EmptyState small title="No strain is called that" words="Change the search." /> : null}
          <Rows bleed label="Strains">
            {shown.map((strain) => (
              <StrainListRow key={strain.id} strain={strain} selected={strain.id === chosen} />
            ))}
          </Rows>
        </>
      )}
    </Screen>
  );
}

const matches = ({ code, displayName, locality, tradeName }: StrainRow, search: string): boolean =>
  [code, displayName, locality ?? '', tradeName ?? ''].some((text) =>
    text.toLowerCase().includes(search.trim().toLowerCase()),
  );

function StrainListRow({ strain, selected }: { strain: StrainRow; selected: boolean }) {
  const room = useRoom();
  const { id, code, displayName, locality, livingFish, colonies, broods, retiredOn } = strain;
  const counts = [plural(colonies, 'colony', 'colonies'), plural(broods, 'brood', 'broods')].join(', ');
  return (
    <Row
      href={`/r/${room.id}/strains/${id}`}
      label={`${code}, ${displayName}, ${livingFish} fish, ${counts}`}
      figure={String(livingFish)}
      unit="fish"
      selected={selected}
      title={
        <Text strong cut>
          <Text italic strong>
            {displayName}
          </Text>
          {locality ? ` ${locality}` : ''}
        </Text>
      }
      note={
        <Text size="small" tone="soft">
          <Code>{code}</Code>
          {` · ${retiredOn ? 'no longer kept' : counts}`}
        </Text>
      }
    />
  );
}

const plural = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;
