import { useQuery } from '@tanstack/react-query';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Menu } from '@/components/ui/Menu';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { SearchField } from '@/components/ui/SearchField';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { Filters, Toolbar } from '@/components/ui/Toolbar';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { broodStage } from '@/shared/broods/broodStage';
import type { BroodRow } from '@/shared/broods/contract';
import { STAGE_NAMES, STAGES, type Stage } from '@/shared/broods/stage';
import { byNumber } from '@/shared/codes';
import { shortName } from '@/shared/species/shortName';
import { formatLength } from '@/shared/unitWords';
import { broodsQuery } from './queries';

const ORDERS = ['newest', 'code', 'heads', 'size'] as const;
type Order = (typeof ORDERS)[number];
const ORDER_WORDS: Record<Order, string> = {
  newest: 'Newest first',
  code: 'By colony',
  heads: 'Most heads',
  size: 'Largest fish',
};

const compare: Record<Order, (a: BroodRow, b: BroodRow) => number> = {
  newest: (a, b) => (a.startedOn < b.startedOn ? 1 : a.startedOn > b.startedOn ? -1 : byNumber(a.code, b.code)),
  code: (a, b) => byNumber(a.code, b.code),
  heads: (a, b) => b.heads - a.heads,
  size: (a, b) => (b.lastSample?.meanTenthsMm ?? 0) - (a.lastSample?.meanTenthsMm ?? 0),
};

/** Broods with their heads in the margin; order, filters and search stay in the address. */
export function BroodList({ chosen }: { chosen?: string }) {
  const room = useRoom();
  const [which, setWhich] = useUrlWord<'here' | 'all'>('which', 'here', ['here', 'all']);
  const [order, setOrder] = useUrlWord<Order>('order', 'newest', ORDERS);
  const [search, setSearch] = useUrlWord<string>('q', '');
  const [stages, setStages] = useUrlWord<string>('stage', '');
  const { data, error, refetch } = useQuery(broodsQuery(room.id, which));
  const on = STAGES.filter((stage) => stages.split(',').includes(stage));
  const staged = (data ?? []).map((brood) => ({ brood, stage: broodStage(brood, room.today) }));
  const shown = staged
    .filter(({ brood, stage }) => (on.length === 0 || on.includes(stage)) && matches(brood, search))
    .sort((a, b) => compare[order](a.brood, b.brood));
  const sort = (
    <Menu
      label="Order"
      icon="sort"
      items={ORDERS.map((one) => ({ word: ORDER_WORDS[one], on: one === order, onPress: () => setOrder(one) }))}
    />
  );
  return (
    <Screen title="Broods" back={`/r/${room.id}/stock`} actions={sort}>
      {!data ? (
        error ? (
          <ErrorState title="The broods could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading broods" />
        )
      ) : (
        <>
          <Toolbar>
            <SearchField value={search} onChange={setSearch} placeholder="Brood, tank, species" />
            <Filters
              label="Stage"
              filters={STAGES.map((value) => ({
                value,
                word: STAGE_NAMES[value],
                count: staged.filter(({ stage }) => stage === value).length,
              })).filter(({ count }) => count > 0)}
              on={on}
              onChange={(next) => setStages(next.join(','))}
            />
            <Filters
              label="Which"
              filters={[{ value: 'all', word: 'Past ones too' }]}
              on={which === 'all' ? ['all'] : []}
              onChange={(next) => setWhich(next.length > 0 ? 'all' : 'here')}
            />
          </Toolbar>
          {shown.length === 0 ? <Nothing any={data.length > 0} /> : null}
          <Rows bleed label="Broods">
            <VirtualList items={shown} keyOf={({ brood }) => brood.id}>
              {({ brood, stage }) => <BroodListRow brood={brood} stage={stage} selected={brood.id === chosen} />}
            </VirtualList>
          </Rows>
        </>
      )}
    </Screen>
  );
}

function Nothing({ any }: { any: boolean }) {
  if (any) return <EmptyState small title="No brood is like that" words="Change the search or the filters." />;
  return (
    <EmptyState
      title="No broods yet"
      words="A brood starts when a female is stripped or lets go, or when fry are found."
    />
  );
}

const matches = ({ code, displayName, locality, tanks }: BroodRow, search: string): boolean => {
  const wanted = search.trim().toLowerCase();
  return [code, displayName ?? '', locality ?? '', ...tanks.map((tank) => tank.code)].some((text) =>
    text.toLowerCase().includes(wanted),
  );
};

function BroodListRow({ brood, stage, selected }: { brood: BroodRow; stage: Stage; selected: boolean }) {
  const room = useRoom();
  const { code, heads, headsAreShare, opened, displayName, locality, lastSample, tanks } = brood;
  const figure = opened === null ? '–' : `${headsAreShare ? '~' : ''}${Math.round(heads)}`;
  const size = lastSample ? formatLength(lastSample.meanTenthsMm, room.units) : 'no sample';
  const where = tanks.map((tank) => tank.code).join(', ');
  return (
    <Row
      href={`/r/${room.id}/broods/${brood.id}`}
      label={`${code}, ${opened === null ? 'not counted yet' : `${Math.round(heads)} heads`}, ${STAGE_NAMES[stage]}, ${size}`}
      figure={figure}
      unit={opened === null ? 'not yet' : 'heads'}
      selected={selected}
      title={<Code>{code}</Code>}
      state={<StageGlyph stage={stage} word size="small" />}
      note={
        <Text size="small" tone="soft" cut>
          {displayName ? <Text italic>{shortName(displayName)}</Text> : 'Possible hybrid'}
          {locality ? ` ${locality}` : ''}
          {` · ${size}${where ? ` · ${where}` : ''}`}
        </Text>
      }
    />
  );
}
