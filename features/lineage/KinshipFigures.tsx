import { useCallback, useMemo, useState } from 'react';
import { View } from 'react-native';
import { type KinFish, KinshipTable } from '@/components/chart/KinshipTable';
import { space } from '@/components/theme/space';
import { EmptyState } from '@/components/ui/EmptyState';
import { Loading } from '@/components/ui/Loading';
import { Text } from '@/components/ui/Text';
import type { LineageNode } from '@/shared/lineage/contract';
import type { Nodes } from './entries';
import { isWanted, kinFishOf, type Order, ordered, type View as Sides, sidesOf } from './group';
import { knownOf } from './known';
import { PairSheet } from './PairSheet';
import { type GroupKinship, useKinship } from './useKinship';

/** As half sibs' young. Common practice, no source. */
const LIMIT = 0.125;

type Props = {
  nodes: Nodes;
  /** All that the compared ones are chosen from. */
  fish: readonly LineageNode[];
  group: readonly LineageNode[];
  search: string;
  order: Order;
  view: Sides;
  said: string;
};

/** The table once its figures are worked out. */
export function KinshipFigures(props: Props) {
  const kin = useKinship(props.nodes, props.fish, props.group);
  return kin ? <Figures {...props} kin={kin} /> : <Loading label="Working out the kinships" rows={6} />;
}

/** The table, what its marks mean, and the pair that was pressed. */
function Figures({ nodes, kin, group, search, order, view, said }: Props & { kin: GroupKinship }) {
  const [picked, setPicked] = useState<{ down: string; across: string } | null>(null);
  const byId = useMemo(() => new Map<string, LineageNode>(group.map((node) => [node.id, node])), [group]);
  const sides = useMemo(
    () => sidesOf(ordered(kinFishOf(group, kin.mean), order, kin.mean), view),
    [group, kin, order, view],
  );
  const down = useMemo(() => sides.down.filter(({ id }) => isWanted(byId.get(id), search)), [sides, byId, search]);
  const valueFor = useCallback(
    (one: KinFish, other: KinFish) => {
      const self = one.id === other.id;
      const fish = [one.id, other.id].flatMap((id) => byId.get(id) ?? []);
      const { short, said: knownSaid } = knownOf(fish, kin.depth);
      const dim = !self && one.sex === other.sex && one.sex !== 'unknown';
      return { f: kin.matrix.between(one.id, other.id), known: short, knownSaid, dim, self };
    },
    [byId, kin],
  );
  const pick = useCallback((one: KinFish, other: KinFish) => setPicked({ down: one.id, across: other.id }), []);
  return (
    <View style={{ gap: space[3] }}>
      <Text size="small" tone="soft">
        {`${group.length} fish. Each figure: the F that their young would have, and how far back the shallower pedigree is known.`}
      </Text>
      {down.length === 0 ? (
        <EmptyState small title="No fish is called that" words="The search looks at codes, tanks and colonies." />
      ) : (
        <KinshipTable
          label={`Kinship in ${said}`}
          across={sides.across}
          down={down}
          valueFor={valueFor}
          limit={LIMIT}
          picked={picked}
          onPick={pick}
        />
      )}
      <Text size="small" tone="soft">
        Bold: under .0625. Red bar: .125 or more, as half sibs. Triangle: .250 or more, as full sibs.
        {sides.view === 'all' ? ' Grey bar: same sex; shaded: a fish with itself.' : ''}
        {' Gen: full generations of ancestors on record. Press a figure for what it rests on.'}
      </Text>
      {picked ? (
        <PairSheet
          key={`${picked.down} ${picked.across}`}
          nodes={nodes}
          pair={[picked.across, picked.down]}
          onClose={() => setPicked(null)}
        />
      ) : null}
    </View>
  );
}
