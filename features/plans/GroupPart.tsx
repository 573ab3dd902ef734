import { View } from 'react-native';
import { ShareBars } from '@/components/chart/ShareBars';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { LineageNode } from '@/shared/lineage/contract';
import { UNKNOWN_FOUNDERS } from '@/shared/lineage/founders';
import { useFounders } from './desk';
import { PairRows } from './PairRows';
import { type Group, LIMITS, type Plan } from './usePlan';
import { type FoundersOf, headsWords } from './why';

/** What the program proposes, or what the keeper made of it: fish, F of every pair, founders carried. */
export function GroupPart({ plan, nodes }: { plan: Plan; nodes: readonly LineageNode[] }) {
  const { proposal, groups } = plan;
  const founders = useFounders(
    nodes,
    [...groups, plan.now].flatMap(({ males, females }) => [...males, ...females]),
  );
  const byId = new Map(nodes.map((node) => [node.id, node]));
  if (!proposal) return <Loading label="Looking for a group that fits" rows={6} />;
  if (proposal.fits === 'none' && groups.length === 0) return <NoGroup plan={plan} because={proposal.because} />;
  return (
    <View style={{ gap: space[5] }}>
      {plan.swappedByHand ? (
        <Notice words="Swapped by hand. The figures are of the fish as they stand here.">
          <Button small label="Back to the proposal" onPress={plan.reset} />
        </Notice>
      ) : proposal.fits === 'two' ? (
        <Notice
          tone="look"
          words="Together in one tank some pair’s young would be over the limit. In two tanks they are not."
        />
      ) : null}
      {groups.map((group, i) => (
        <OneGroup
          key={i === 0 ? 'first' : 'second'}
          title={groups.length > 1 ? `Tank ${i + 1}` : 'Proposed group'}
          group={group}
          figures={plan.figures[i] ?? null}
          plan={plan}
          founders={founders}
          byId={byId}
        />
      ))}
    </View>
  );
}

function NoGroup({ plan, because }: { plan: Plan; because: string }) {
  const { atLimit } = plan.proposal?.fits === 'none' ? plan.proposal : { atLimit: null };
  const limit = LIMITS.find((one) => Number(one) === atLimit);
  return (
    <Section title="Proposed group">
      <Notice tone="look" title="Nothing fits" words={`${because}.`}>
        {limit ? <Button small label={`Allow F up to ${limit}`} onPress={() => plan.setLimit(limit)} /> : null}
      </Notice>
    </Section>
  );
}

type OneProps = {
  title: string;
  group: Group;
  figures: Plan['figures'][number];
  plan: Plan;
  founders: FoundersOf;
  byId: ReadonlyMap<string, LineageNode>;
};

function OneGroup({ title, group, figures, plan, founders, byId }: OneProps) {
  const shares = [...founders([...group.males, ...group.females])]
    .filter(([id]) => id !== UNKNOWN_FOUNDERS)
    .sort((a, b) => b[1] - a[1]);
  const have = founders([...plan.now.males, ...plan.now.females]);
  const wordOf = (id: string) => byId.get(id)?.code ?? 'one without a code';
  const fresh = shares.filter(([id]) => !have.has(id));
  return (
    <Section title={title} aside={headsWords(group)}>
      {figures ? (
        <FiguresStrip
          figures={[
            {
              figure: figures.highest.toFixed(3),
              label: 'highest F of a pair',
              ...(figures.highest > Number(plan.limit) ? { tone: 'trouble' as const } : {}),
            },
            { figure: figures.meanFryInbreeding.toFixed(3), label: 'mean F of the young' },
            { figure: figures.geneDiversity.toFixed(3), label: 'gene diversity kept' },
          ]}
        />
      ) : null}
      <View style={{ gap: space[4], paddingTop: space[3] }}>
        <Swaps group={group} plan={plan} />
        {shares.length > 0 ? (
          <ShareBars
            shares={shares.map(([key, share]) => ({ key, word: wordOf(key), share, marked: !have.has(key) }))}
            sentence={`Founders carried: ${shares.map(([id, share]) => `${wordOf(id)} ${Math.round(100 * share)} %`).join(', ')}`}
          />
        ) : null}
        {fresh.length > 0 && plan.now.code ? (
          <Text size="small" tone="soft">
            {`New beside ${plan.now.code}: ${fresh.map(([id]) => wordOf(id)).join(', ')}.`}
          </Text>
        ) : null}
        {figures ? <PairRows pairs={figures.pairs} limit={Number(plan.limit)} founders={founders} byId={byId} /> : null}
      </View>
    </Section>
  );
}

/** Each chosen fish, exchangeable for any other of its sex that is not in the plan. */
function Swaps({ group, plan }: { group: Group; plan: Plan }) {
  const inPlan = new Set(plan.groups.flatMap(({ males, females }) => [...males, ...females]));
  const byId = new Map(plan.candidates.map((one) => [one.id, one]));
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
      {[...group.males, ...group.females].map((id) => {
        const fish = byId.get(id);
        if (!fish) return null;
        const others = plan.candidates.filter((one) => one.sex === fish.sex && plan.isIn(one) && !inPlan.has(one.id));
        return (
          <View key={id} style={{ flexDirection: 'row', alignItems: 'center', gap: space[2], minWidth: 190 }}>
            <SexShape sex={fish.sex} />
            <View style={{ flexGrow: 1 }}>
              <Select
                label={`Swap ${fish.code} for`}
                value={id}
                options={[fish, ...others].map((one) => ({ value: one.id, code: one.code, word: one.tank ?? '' }))}
                onChange={(to) => plan.swap(id, to)}
              />
            </View>
          </View>
        );
      })}
    </View>
  );
}
