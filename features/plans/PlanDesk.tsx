import { useQuery } from '@tanstack/react-query';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { EmptyState } from '@/components/ui/EmptyState';
import { Loading } from '@/components/ui/Loading';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { LineageNode } from '@/shared/lineage/contract';
import { profileSeen } from '@/shared/species/profilesIn';
import { CandidatesPart } from './CandidatesPart';
import { GroupPart } from './GroupPart';
import { LimitsPart } from './LimitsPart';
import { NowPart } from './NowPart';
import { speciesSetQuery, strainsQuery } from './queries';
import { SavedPlans } from './SavedPlans';
import { SavePlan } from './SavePlan';
import { usePlan } from './usePlan';

type Props = {
  /** The whole pedigree, and the animals of the strain or colony that is planned for. */
  nodes: readonly LineageNode[];
  of: readonly LineageNode[];
};

/** Who breeds with whom: limits, fish to choose from, the group that the program proposes, and why. */
export function PlanDesk({ nodes, of }: Props) {
  const room = useRoom();
  const { data: strains } = useQuery(strainsQuery(room.id));
  const { data: set } = useQuery(speciesSetQuery(room.id));
  if (!strains || !set) return <Loading label="Loading the species" />;
  const strainId = of.find((node) => node.strainId)?.strainId ?? null;
  const speciesId = strains.find(({ id }) => id === strainId)?.speciesId;
  const own = set.find(({ id }) => id === speciesId);
  const overrides = Object.fromEntries(Object.entries(own?.figures ?? {}).map(([name, { value }]) => [name, value]));
  const profile = speciesId
    ? profileSeen({ id: speciesId, name: own?.scientificName ?? 'Species', about: own?.about ?? null, overrides })
    : null;
  if (!strainId) return <EmptyState small title="No strain yet" words="A plan is made for the fish of one strain." />;
  return <Desk nodes={nodes} of={of} profile={profile} strainId={strainId} />;
}

type DeskProps = Props & { profile: ReturnType<typeof profileSeen>; strainId: string };

function Desk({ nodes, of, profile, strainId }: DeskProps) {
  const { today } = useRoom();
  const wide = useIsWide();
  const plan = usePlan({ nodes, of, profile, today });
  const notSexed = of.filter(
    ({ thing, living, sex, keptAs }) => thing === 'fish' && living && sex === 'unknown' && keptAs !== 'other',
  ).length;
  return (
    <View style={{ gap: space[5] }}>
      <SavedPlans strainId={strainId} />
      <View style={wide ? styles.columns : { gap: space[5] }}>
        <View style={wide ? styles.narrow : null}>
          <LimitsPart plan={plan} profile={profile} />
          <CandidatesPart plan={plan} />
          {notSexed > 0 ? (
            <Text size="small" tone="soft">
              {`${notSexed} of this choice ${notSexed === 1 ? 'is' : 'are'} not sexed and cannot be planned with yet.`}
            </Text>
          ) : null}
        </View>
        <View style={styles.fill}>
          <GroupPart plan={plan} nodes={nodes} />
          <NowPart plan={plan} />
          {plan.groups.length > 0 ? <SavePlan plan={plan} strainId={strainId} profile={profile} /> : null}
        </View>
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  columns: { flexDirection: 'row', gap: space[6] },
  narrow: { width: 340 },
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
});
