import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { lazy, type ReactNode, Suspense, useState } from 'react';
import { View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { LineageNode } from '@/shared/lineage/contract';
import { relativesWithin } from '@/shared/lineage/relatives';
import { may } from '@/shared/roles';
import { entryOf, type Nodes, nameOf } from './entries';
import { figuresOf } from './figures';
import { FoundersOf, InbreedingFigures } from './InbreedingFigures';
import { pedigreeAroundQuery } from './queries';

const LineageGraph = lazy(() => import('./LineageGraph').then((module) => ({ default: module.LineageGraph })));

/** One animal's lineage: its possible parents and their shares, expected F and what it rests on, founders, the sheet it came by. */
export function LineageOfScreen({ id, sheet }: { id: string; sheet: ReactNode }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(pedigreeAroundQuery(room.id, id));
  const node = data?.find((one) => one.id === id);
  if (data && node) return <LineageOf key={id} nodes={data} node={node} sheet={sheet} />;
  return (
    <Screen title="Lineage" back={`/r/${room.id}/lineage`}>
      {error ? (
        <ErrorState title="This lineage could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the lineage" />
      )}
    </Screen>
  );
}

const DEPTHS = [
  { value: '1', word: 'Parents' },
  { value: '2', word: 'Two back' },
  { value: '3', word: 'Three' },
  { value: '9', word: 'All' },
] as const;

function LineageOf({ nodes, node, sheet }: { nodes: Nodes; node: LineageNode; sheet: ReactNode }) {
  const room = useRoom();
  const router = useRouter();
  const wide = useIsWide();
  const [depth, setDepth] = useState<(typeof DEPTHS)[number]['value']>('3');
  const figures = figuresOf(nodes, node.id);
  const near = relativesWithin(nodes.map(entryOf), node.id, { ancestors: Number(depth), descendants: 1 });
  const ids = new Set(near.entries.map(({ id }) => id));
  const shown = nodes.filter(({ id }) => ids.has(id));
  const place = node.thing === 'brood' ? 'broods' : 'fish';
  const home = `/r/${room.id}` as const;
  return (
    <Screen
      title={nameOf(node)}
      code={node.code !== null}
      subtitle={
        <Text tone="soft">
          {node.displayName ? <Text italic>{node.displayName}</Text> : 'No strain claimed'}
          {figures.generation ? ` · ${figures.generation}` : ''}
        </Text>
      }
      back={`${home}/lineage`}
    >
      <View style={{ gap: space[4], marginBottom: space[5] }}>
        <InbreedingFigures figures={figures} />
        <Segmented label="How far back" as="tabs" choices={DEPTHS} value={depth} onChange={setDepth} />
        <Suspense fallback={<Loading label="Drawing the lineage" rows={4} />}>
          <LineageGraph
            key={depth}
            label={`Lineage of ${nameOf(node)}`}
            shown={shown}
            all={nodes}
            selected={node.id}
            onSelect={(other) => router.push(`${home}/lineage/${other}`)}
            windowHeight={wide ? 520 : 420}
          />
        </Suspense>
        <ButtonRow>
          <Button
            grow
            small
            label={node.thing === 'brood' ? 'The brood' : 'The fish'}
            href={`${home}/${place}/${node.id}`}
          />
          {may(room.role, 'parentage:write') ? (
            <Button grow small icon="edit" label="Set parents" href={`${home}/lineage/parents/${node.id}`} />
          ) : null}
          {may(room.role, 'sheet:see') ? (
            <Button
              grow
              small
              icon="print"
              label="Lineage sheet"
              href={`${home}/sheets/new?${node.thing}=${node.id}`}
            />
          ) : null}
        </ButtonRow>
      </View>
      {sheet}
      <Section title="Founders" aside={figures.founders.length > 0 ? String(figures.founders.length) : undefined}>
        <FoundersOf figures={figures} />
      </Section>
    </Screen>
  );
}
