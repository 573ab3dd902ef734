import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Tabs } from '@/components/ui/Tabs';
import { useRoom } from '@/hooks/useRoom';
import { ChooseFish } from './ChooseFish';
import type { Nodes } from './entries';
import { pedigreeQuery } from './queries';
import { type Scope, useScope, useScopeQuery } from './scope';

export type LineageTab = 'graph' | 'kinship' | 'founders' | 'plan' | 'sheets';
type Props = { tab: LineageTab; actions?: ReactNode; children: (nodes: Nodes, scope: Scope) => ReactNode };

/** The Lineage place: its pages side by side, and the strain or colony that they are about. */
export function LineageFrame({ tab, actions, children }: Props) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(pedigreeQuery(room.id));
  return (
    <Screen title="Lineage" actions={actions} fixed={<LineageTabs tab={tab} />}>
      {!data ? (
        error ? (
          <ErrorState title="The lineage could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading the lineage" />
        )
      ) : data.length === 0 ? (
        <EmptyState
          title="No fish yet"
          words="Founders come in with a colony; broods and holdbacks follow by themselves."
        >
          <Button label="Add a colony" href={`/r/${room.id}/colonies/new`} />
        </EmptyState>
      ) : (
        <InScope nodes={data}>{children}</InScope>
      )}
    </Screen>
  );
}

export function LineageTabs({ tab }: { tab: LineageTab }) {
  const { id: roomId } = useRoom();
  const query = useScopeQuery();
  const home = `/r/${roomId}/lineage` as const;
  return (
    <Tabs
      label="Lineage"
      value={tab}
      tabs={[
        { value: 'graph', word: 'Graph', href: `${home}?${query}` },
        { value: 'kinship', word: 'Kinship', href: `${home}/kinship?${query}` },
        { value: 'founders', word: 'Founders', href: `${home}/founders?${query}` },
        { value: 'plan', word: 'Pairing plan', href: `${home}/plan?${query}` },
        { value: 'sheets', word: 'Sheets', href: `${home}/sheets` },
      ]}
    />
  );
}

function InScope({ nodes, children }: { nodes: Nodes; children: Props['children'] }) {
  const { scopes, scope, setScope, setChosen } = useScope(nodes);
  if (!scope) return <EmptyState title="No strain yet" words="Fish without a strain are shown on their own pages." />;
  return (
    <View style={{ gap: space[4], paddingTop: space[3] }}>
      <View style={styles.of}>
        <View style={styles.scope}>
          <Select label="Of" options={scopes} value={scope.value} onChange={setScope} />
        </View>
        {scope.ids ? <ChooseFish nodes={nodes} chosen={scope.ids} onChange={setChosen} /> : null}
      </View>
      {scope.ids?.length === 0 ? (
        <EmptyState small title="No fish chosen yet" words="Choose any fish to compare, living or not." />
      ) : (
        children(nodes, scope)
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  of: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2] },
  scope: { flexGrow: 1, flexBasis: 260, maxWidth: 420 },
});
