import { useQuery } from '@tanstack/react-query';
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
import { LIBRARY } from '@/shared/species/library';
import { type BreedingMode, MODE_WORDS } from '@/shared/species/species';
import { speciesQuery } from './queries';

type Line = { id: string; name: string; mode: BreedingMode; note: string | null };

/** The built-in species and the fishroom's own. */
export function SpeciesList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const [search, setSearch] = useUrlWord<string>('q', '');
  const { data, error, refetch } = useQuery(speciesQuery(room.id));
  const own: Line[] = (data ?? []).flatMap(({ id, own: isOwn, scientificName, about }) =>
    isOwn && about ? [{ id, name: scientificName ?? '', mode: about.mode, note: 'Your own' }] : [],
  );
  const changed = new Set(data?.flatMap((one) => (Object.keys(one.figures).length > 0 ? [one.id] : [])));
  const library: Line[] = LIBRARY.map(({ id, name, mode }) => ({
    id,
    name,
    mode,
    note: changed.has(id) ? 'Figures of your own' : null,
  }));
  const wanted = search.trim().toLowerCase();
  const shown = [...own, ...library]
    .filter(({ name, mode }) => `${name} ${MODE_WORDS[mode]}`.toLowerCase().includes(wanted))
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
  return (
    <Screen
      title="Species"
      back={`/r/${room.id}/stock`}
      actions={
        may(room.role, 'stock:write') ? (
          <IconButton icon="plus" label="Add a species" href={`/r/${room.id}/species/new`} />
        ) : undefined
      }
    >
      {error ? (
        <ErrorState title="The species could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : data ? (
        <>
          <Toolbar>
            <SearchField value={search} onChange={setSearch} placeholder="Species" />
          </Toolbar>
          <Rows bleed label="Species">
            {shown.map(({ id, name, mode, note }) => (
              <Row
                key={id}
                href={`/r/${room.id}/species/${id}`}
                label={`${name}, ${MODE_WORDS[mode]}`}
                selected={id === chosen}
                title={
                  <Text italic strong>
                    {name}
                  </Text>
                }
                note={MODE_WORDS[mode]}
                {...(note ? { trailing: note } : {})}
              />
            ))}
          </Rows>
        </>
      ) : (
        <Loading label="Loading species" />
      )}
    </Screen>
  );
}
