import { useMemo } from 'react';
import { View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { EmptyState } from '@/components/ui/EmptyState';
import { useSearchWord } from '@/hooks/useSearchWord';
import { useUrlWord } from '@/hooks/useUrlWord';
import type { Nodes } from './entries';
import { comparedOf, fishIn, KEPT, type Order, type View as Sides } from './group';
import { KinshipControls } from './KinshipControls';
import { KinshipFigures } from './KinshipFigures';
import { LineageFrame } from './LineageFrame';
import type { Scope } from './scope';

/** Who is related to whom, and how closely: the figure of each two fish is the F that their young would have. */
export function KinshipScreen() {
  return (
    <LineageFrame tab="kinship">
      {(nodes, scope) => <Compared key={scope.value} nodes={nodes} scope={scope} />}
    </LineageFrame>
  );
}

function Compared({ nodes, scope }: { nodes: Nodes; scope: Scope }) {
  const wide = useIsWide();
  const [search, setSearch] = useSearchWord('q');
  const [keptWord, setKept] = useSearchWord('show');
  const [order, setOrder] = useUrlWord<Order>('sort', 'mean', ['mean', 'code']);
  const [view, setView] = useUrlWord<Sides>('view', wide ? 'all' : 'pairs', ['pairs', 'all']);
  const fish = useMemo(() => fishIn(nodes, scope), [nodes, scope]);
  const group = useMemo(
    () =>
      comparedOf(
        fish,
        scope,
        KEPT.filter((word) => keptWord.split(',').includes(word)),
      ),
    [fish, scope, keptWord],
  );
  if (fish.length === 0)
    return (
      <EmptyState
        small
        title="No fish with a record of its own lives here"
        words="Broods are compared once fish have been taken out of them."
      />
    );
  const controls = { search, setSearch, kept: keptWord, setKept, order, setOrder, view, setView };
  return (
    <View>
      <KinshipControls {...controls} fish={fish} choosable={!scope.ids} />
      {group.length === 0 ? (
        <EmptyState small title="No fish is like that" words="Change the filters." />
      ) : (
        <KinshipFigures
          nodes={nodes}
          fish={fish}
          group={group}
          search={search}
          order={order}
          view={view}
          said={scope.said}
        />
      )}
    </View>
  );
}
