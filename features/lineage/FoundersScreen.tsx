import { useMemo } from 'react';
import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { Section } from '@/components/ui/Section';
import { ColonyDiversity } from './ColonyDiversity';
import type { Nodes } from './entries';
import { FounderRows } from './FounderRows';
import { groupFacts } from './founderFacts';
import { founderSummary, GroupFigures } from './GroupFigures';
import { comparedOf, fishIn } from './group';
import { LineageFrame } from './LineageFrame';
import type { Scope } from './scope';
import { useKinship } from './useKinship';

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
  const kin = useKinship(nodes, group);
  const facts = useMemo(() => (group.length > 0 ? groupFacts(nodes, kin, group) : null), [nodes, kin, group]);
  if (!facts)
    return (
      <EmptyState
        small
        title="No fish with a record of its own lives here"
        words="Founders are seen once fish have been taken in or held back."
      />
    );
  return (
    <View>
      <GroupFigures facts={facts} fish={group.length} />
      <Section title="Founders’ shares" aside={founderSummary(facts)}>
        <FounderRows facts={facts} />
      </Section>
      <ColonyDiversity nodes={nodes} kin={kin} fish={fish} chosen={scope.ids !== undefined} />
    </View>
  );
}
