import { lazy, Suspense } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Code } from '@/components/ui/Code';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { KeyValues } from '@/components/ui/KeyValues';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SectionHead } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { useWorked } from '@/hooks/useWorked';
import type { LineageNode } from '@/shared/lineage/contract';
import { inbreedingWords } from '@/shared/sheets/sayings';
import { deskWith } from './desk';
import { type Nodes, nameOf } from './entries';
import type { PairFacts } from './pairFacts';

const LineageGraph = lazy(() => import('./LineageGraph').then((module) => ({ default: module.LineageGraph })));

type Props = { nodes: Nodes; pair: readonly [string, string]; onClose: () => void };

/** What the kinship of two fish rests on: shared ancestors, doubtful parents dashed, and how much of both pedigrees is known. */
export function PairSheet({ nodes, pair, onClose }: Props) {
  const [a, b] = pair.map((id) => nodes.find((node) => node.id === id));
  if (!a || !b) return null;
  const title = a.id === b.id ? nameOf(a) : `${nameOf(a)} and ${nameOf(b)}`;
  return (
    <Sheet open onClose={onClose} title={title} width={520}>
      <PairFound nodes={nodes} a={a} b={b} />
    </Sheet>
  );
}

type BodyProps = { nodes: Nodes; a: LineageNode; b: LineageNode };

function PairFound({ nodes, a, b }: BodyProps) {
  const { data: facts } = useWorked('pair', [nodes, a, b], async () => {
    const { desk, turn } = await deskWith(nodes);
    return desk.pair(turn, a.id, b.id);
  });
  return facts ? (
    <PairBody nodes={nodes} facts={facts} a={a} b={b} />
  ) : (
    <Loading label="Working out what it rests on" rows={4} />
  );
}

function PairBody({ nodes, facts, a, b }: BodyProps & { facts: PairFacts }) {
  const room = useRoom();
  const self = a.id === b.id;
  return (
    <View style={{ gap: space[4] }}>
      <PairFigures facts={facts} self={self} />
      <KeyValues pairs={facts.known.map(({ code, said }) => ({ key: code, value: capital(said) }))} />
      {self ? null : <Shared facts={facts} />}
      {!self && facts.shared.length > 0 ? (
        <Suspense fallback={<Loading label="Drawing the lineage" rows={3} />}>
          <LineageGraph
            label={`What ${nameOf(a)} and ${nameOf(b)} share`}
            shown={facts.between}
            all={nodes}
            selected={null}
            onSelect={() => undefined}
            windowHeight={300}
          />
        </Suspense>
      ) : null}
      {facts.doubts.length > 0 ? (
        <View style={{ gap: space[1] }}>
          <Text semi>Not certain</Text>
          {facts.doubts.map((said) => (
            <Text key={said} size="small" tone="soft">
              {said}
            </Text>
          ))}
        </View>
      ) : null}
      <ButtonRow>
        {[...new Set([a, b])].map((node) => (
          <Button
            key={node.id}
            grow
            small
            icon="lineage"
            label={nameOf(node)}
            describe={`Lineage of ${nameOf(node)}`}
            href={`/r/${room.id}/lineage/${node.id}`}
          />
        ))}
      </ButtonRow>
    </View>
  );
}

function PairFigures({ facts, self }: { facts: PairFacts; self: boolean }) {
  const { f, outcomes, generationsKnown } = facts;
  const words = self
    ? `A fish with itself: half of 1 + its own F, which is ${Math.max(0, 2 * f - 1).toFixed(3)}.`
    : `Of their young: ${inbreedingWords({ f, outcomes, generationsKnown: Math.max(generationsKnown, 0.001) })}.`;
  return (
    <View style={{ gap: space[2] }}>
      <FiguresStrip
        figures={[
          { figure: f.toFixed(3), label: self ? 'kinship with itself' : 'kinship' },
          { figure: generationsKnown.toFixed(1), label: 'generations known' },
        ]}
      />
      <Text size="small" tone="soft">
        {words}
      </Text>
    </View>
  );
}

function Shared({ facts }: { facts: PairFacts }) {
  if (facts.shared.length === 0) return <Text tone="soft">They share no ancestor that is on record.</Text>;
  return (
    <View>
      <SectionHead title="Shared ancestors" aside={String(facts.shared.length)} level={3} />
      <Rows label="Shared ancestors" open>
        {facts.shared.map(({ id, code, words, certain, sex }) => (
          <Row
            key={id}
            margin={<SexShape sex={sex} possible={!certain} />}
            title={<Code>{code}</Code>}
            note={words}
            trailing={certain ? undefined : 'possible'}
          />
        ))}
      </Rows>
    </View>
  );
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
