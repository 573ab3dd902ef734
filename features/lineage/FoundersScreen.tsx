import { useMemo } from 'react';
import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { Loading } from '@/components/ui/Loading';
import { Section } from '@/components/ui/Section';
import { useWorked } from '@/hooks/useWorked';
import type { LineageNode } from '@/shared/lineage/contract';
import { ColonyDiversity } from './ColonyDiversity';
import { deskWith } from './desk';
import type { Nodes } from './entries';
import { FounderRows } from './FounderRows';
import { founderSummary, GroupFigures } from './GroupFigures';
import { comparedOf, fishIn } from './group';
import { LineageFrame } from './LineageFrame';
import type { Scope } from './scope';

const idsOf = (fish: readonly LineageNode[]): string[] => fish.map(({ id }) => id);

/** Where the genes of the breeders come from, what is at risk, and what the colonies will keep of it. */
export function FoundersScreen() {
  return (
    <LineageFrame tab="founders">
      {(nodes, scope) => <FoundersIn key={scope.value} nodes={nodes} scope={scope} />}
    </LineageFrame>
  );
}

function FoundersIn({ nodes, scope }: { nodes: Nodes; scope: Scope }) {
  const fish = useMemo(() => fishIn(nodes, scope), [nodes, scope]);
  const group = useMemo(() => comparedOf(fish, scope, []), [fish, scope]);
  const chosen = scope.ids !== undefined;
  const { data } = useWorked('founders', [nodes, fish, group], async () => {
    const { desk, turn } = await deskWith(nodes);
    return desk.founders(turn, idsOf(group), idsOf(fish), chosen);
  });
  if (group.length === 0)
    return (
      <EmptyState
        small
        title="No fish with a record of its own lives here"
        words="Founders are seen once fish have been taken in or held back."
      />
    );
  if (!data) return <Loading label="Working out the founders’ shares" rows={6} />;
  const { facts, colonies } = data;
  return (
    <View>
      <GroupFigures facts={facts} fish={group.length} />
      <Section title="Founders’ shares" aside={founderSummary(facts)}>
        <FounderRows facts={facts} />
      </Section>
      <ColonyDiversity colonies={colonies} chosen={chosen} />
    </View>
  );
}
