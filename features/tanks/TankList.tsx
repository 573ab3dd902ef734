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
import { Filters, Toolbar } from '@/components/ui/Toolbar';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { may } from '@/shared/roles';
import { type Resident, TANK_PURPOSE_WORDS, TANK_PURPOSES, type TankRow } from '@/shared/tanks/contract';
import { formatVolume } from '@/shared/unitWords';
import { tanksQuery } from './queries';

/** Every tank in walking order, with who lives in it. */
export function TankList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(tanksQuery(room.id));
  const [search, setSearch] = useUrlWord<string>('q', '');
  const [purposes, setPurposes] = useUrlWord<string>('for', '');
  const on = TANK_PURPOSES.filter((purpose) => purposes.split(',').includes(purpose));
  const tanks = data?.tanks.filter(({ retiredOn }) => retiredOn === null) ?? [];
  const shown = tanks.filter((tank) => matches(tank, search) && (on.length === 0 || on.includes(tank.purpose)));
  const add = may(room.role, 'stock:write') ? (
    <IconButton icon="plus" label="Add a tank" href={`/r/${room.id}/tanks/new`} />
  ) : null;
  const actions = (
    <>
      {tanks.length > 0 ? <IconButton icon="print" label="Print labels" href={`/r/${room.id}/labels`} /> : null}
      {add}
    </>
  );
  return (
    <Screen title="Tanks" back={`/r/${room.id}/stock`} actions={actions}>
      {!data ? (
        error ? (
          <ErrorState title="The tanks could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading tanks" />
        )
      ) : tanks.length === 0 ? (
        <EmptyState
          title="No tanks yet"
          words="A tank has a code of its own, as it is painted on the glass, and its litres."
        >
          {add ? <Button label="Add a tank" href={`/r/${room.id}/tanks/new`} /> : null}
        </EmptyState>
      ) : (
        <>
          <Toolbar>
            <SearchField value={search} onChange={setSearch} placeholder="Tank, place, fish" />
            <Filters
              label="What for"
              filters={TANK_PURPOSES.map((value) => ({
                value,
                word: TANK_PURPOSE_WORDS[value],
                count: tanks.filter(({ purpose }) => purpose === value).length,
              })).filter(({ count }) => count > 0)}
              on={on}
              onChange={(next) => setPurposes(next.join(','))}
            />
          </Toolbar>
          {shown.length === 0 ? (
            <EmptyState small title="None of the tanks is like that" words="Change the search or the filters." />
          ) : null}
          <Rows bleed label="Tanks">
            {shown.map((tank) => (
              <TankListRow key={tank.id} tank={tank} selected={tank.id === chosen} />
            ))}
          </Rows>
        </>
      )}
    </Screen>
  );
}

const matches = ({ code, place, residents }: TankRow, search: string): boolean => {
  const wanted = search.trim().toLowerCase();
  return [code, place ?? '', ...residents.flatMap((one) => [one.code, one.displayName ?? ''])].some((text) =>
    text.toLowerCase().includes(wanted),
  );
};

function TankListRow({ tank, selected }: { tank: TankRow; selected: boolean }) {
  const room = useRoom();
  const volume = formatVolume(tank.litres, room.units);
  const [figure = '', unit = ''] = volume.split(' ');
  return (
    <Row
      href={`/r/${room.id}/tanks/${tank.id}`}
      label={`Tank ${tank.code}, ${volume}, ${residentWords(tank.residents)}`}
      figure={figure}
      unit={unit}
      selected={selected}
      title={<Code>{tank.code}</Code>}
      note={residentWords(tank.residents)}
      trailing={tank.place ?? TANK_PURPOSE_WORDS[tank.purpose]}
    />
  );
}

/** "DUMA-A, 9 fish", "DUMA-26C, 29 heads", "empty". */
export function residentWords(residents: Resident[]): string {
  if (residents.length === 0) return 'Empty';
  const fish = residents.filter(({ thing }) => thing === 'fish');
  const groups = residents
    .filter(({ thing }) => thing !== 'fish')
    .map(({ code, heads, thing }) => `${code}, ${heads} ${thing === 'batch' ? 'heads' : 'fish'}`);
  return [...groups, ...(fish.length > 0 ? [`${fish.length} single fish`] : [])].join(' · ');
}
