import { useRouter } from 'expo-router';
import { lazy, Suspense, useMemo, useState } from 'react';
import { View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Loading } from '@/components/ui/Loading';
import { SearchField } from '@/components/ui/SearchField';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { useSearchWord } from '@/hooks/useSearchWord';
import type { LineageNode } from '@/shared/lineage/contract';
import { ContradictionsLink } from './ContradictionsLink';
import type { Nodes } from './entries';
import { FoundAnimals } from './FoundAnimals';
import { LineageFrame } from './LineageFrame';
import { inScope, type Scope, withAncestors } from './scope';

const LineageGraph = lazy(() => import('./LineageGraph').then((module) => ({ default: module.LineageGraph })));

/** A drawing of more than this can't be read as a whole and takes seconds to place. */
const READABLE = 60;

/** All living fish and broods of a strain with three generations behind them. */
export function LineageGraphScreen() {
  const room = useRoom();
  return (
    <LineageFrame
      tab="graph"
      actions={<Button small icon="download" label="Table" href={`/r/${room.id}/lineage/table`} />}
    >
      {(nodes, scope) => <GraphIn key={scope.value} nodes={nodes} scope={scope} />}
    </LineageFrame>
  );
}

function GraphIn({ nodes, scope }: { nodes: Nodes; scope: Scope }) {
  const [search, setSearch] = useSearchWord('q');
  const [whole, setWhole] = useState(false);
  const living = useMemo(() => inScope(nodes, scope).filter((node) => node.living), [nodes, scope]);
  const many = living.length > READABLE;
  const listed = search.trim() !== '' || (many && !whole);
  return (
    <View style={{ gap: space[3] }}>
      <ContradictionsLink />
      <SearchField value={search} onChange={setSearch} placeholder="Fish, brood, tank, colony" />
      <Text tone="soft">
        {`${living.length} living fish and broods. ${listed ? 'Press one for its own lineage.' : 'Drawn with their ancestors over three generations; press one for its own page.'}`}
      </Text>
      {listed ? (
        <FoundAnimals nodes={search.trim() === '' ? living : inScope(nodes, scope)} search={search} />
      ) : (
        <Drawing nodes={nodes} living={living} scope={scope} />
      )}
      {many && search.trim() === '' ? (
        <Button
          label={whole ? 'Show them as a list' : `Draw all ${living.length}, which takes a while`}
          onPress={() => setWhole(!whole)}
        />
      ) : null}
    </View>
  );
}

function Drawing({ nodes, living, scope }: { nodes: Nodes; living: LineageNode[]; scope: Scope }) {
  const room = useRoom();
  const router = useRouter();
  const wide = useIsWide();
  const shown = useMemo(() => withAncestors(nodes, living), [nodes, living]);
  return (
    <Suspense fallback={<Loading label="Drawing the lineage" rows={4} />}>
      <LineageGraph
        label={`Lineage of ${scope.said}`}
        shown={shown}
        all={nodes}
        selected={null}
        onSelect={(id) => router.push(`/r/${room.id}/lineage/${id}`)}
        windowHeight={wide ? 560 : 460}
      />
    </Suspense>
  );
}
