import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import type { LineageNode } from '@/shared/lineage/contract';
import { groupFigures } from '@/shared/lineage/proposeGroups';
import type { PlanRow } from '@/shared/plans/contract';
import { may } from '@/shared/roles';
import { CarryOut } from './CarryOut';
import { useFounders, useMatrix } from './desk';
import { PairRows } from './PairRows';
import { planQuery } from './queries';
import { STATE_WORDS } from './SavedPlans';
import { headsWords } from './why';

type Props = { planId: string; nodes: readonly LineageNode[] | undefined };

/** A saved plan with the figures of today's pedigree: printed, carried out, or dropped. */
export function PlanScreen({ planId, nodes }: Props) {
  const room = useRoom();
  const { data: plan, error, refetch } = useQuery(planQuery(room.id, planId));
  const back = `/r/${room.id}/lineage/plan` as const;
  if (plan && nodes) return <Page plan={plan} nodes={nodes} back={back} />;
  return (
    <Screen title="Pairing plan" back={back}>
      {error ? (
        <ErrorState title="The plan could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the plan" />
      )}
    </Screen>
  );
}

type PageProps = { plan: PlanRow; nodes: readonly LineageNode[]; back: `/r/${string}/lineage/plan` };

function Page({ plan, nodes, back }: PageProps) {
  const room = useRoom();
  const { groups, note, limit } = plan.content;
  const byId = new Map(nodes.map((node) => [node.id, node]));
  const ids = groups.flatMap(({ males, females }) => [...males, ...females]);
  const known = ids.filter((id) => byId.has(id));
  const matrix = useMatrix(nodes, known);
  const founders = useFounders(nodes, known);
  const gone = plan.gone.map(({ code }) => code ?? 'one without a code').join(', ');
  return (
    <Screen title={plan.name} subtitle={<Text tone="soft">{STATE_WORDS[plan.state]}</Text>} back={back}>
      <View style={{ gap: space[5] }}>
        {plan.colony ? (
          <Notice words="It was carried out as">
            <TextLink label={plan.colony.code} href={`/r/${room.id}/colonies/${plan.colony.id}`} />
          </Notice>
        ) : null}
        {gone && plan.state === 'draft' ? (
          <Notice tone="act" words={`Not here any more: ${gone}. Make a new plan without them.`} />
        ) : null}
        {known.length < ids.length ? (
          <EmptyState small title="Some of its fish are merged or removed" words="Make a new plan." />
        ) : (
          groups.map(({ males, females }, i) => {
            const figures = matrix ? groupFigures(matrix, males, females) : null;
            if (!figures) return <Loading key={males.join()} label="Working out the figures" rows={4} />;
            return (
              <Section
                key={males.join()}
                title={groups.length > 1 ? `Tank ${i + 1}` : 'The group'}
                aside={headsWords({ males, females })}
              >
                <FiguresStrip
                  figures={[
                    { figure: figures.highest.toFixed(3), label: 'highest F of a pair' },
                    { figure: figures.meanFryInbreeding.toFixed(3), label: 'mean F of the young' },
                    { figure: figures.geneDiversity.toFixed(3), label: 'gene diversity kept' },
                  ]}
                />
                <PairRows pairs={figures.pairs} limit={limit} founders={founders} byId={byId} />
              </Section>
            );
          })
        )}
        {note ? <Text>{note}</Text> : null}
        <View style={{ flexDirection: 'row' }}>
          <Button small label="Print" onPress={() => globalThis.print?.()} />
        </View>
        {plan.state === 'draft' && gone === '' && may(room.role, 'plan:write') ? <CarryOut plan={plan} /> : null}
      </View>
    </Screen>
  );
}
