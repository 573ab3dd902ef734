import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SexShape } from '@/components/ui/SexShape';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { byNumber } from '@/shared/codes';
import type { LineageNode } from '@/shared/lineage/contract';
import { type Nodes, nameOf, saidOf } from './entries';
import { isWanted } from './group';

/** Fish and broods by what was typed, each leading to the graph around it; those that live here first. */
export function FoundAnimals({ nodes, search }: { nodes: Nodes; search: string }) {
  const byId = new Map<string, LineageNode>(nodes.map((node) => [node.id, node]));
  const found = nodes
    .filter((node) => node.code !== null && isWanted(node, search))
    .sort((a, b) => Number(b.living) - Number(a.living) || byNumber(nameOf(a), nameOf(b)));
  if (found.length === 0)
    return <EmptyState small title="None is called that" words="The search looks at codes, tanks and colonies." />;
  return (
    <Rows bleed label="Fish and broods">
      <VirtualList items={found} keyOf={({ id }) => id} allUnder={30}>
        {(node) => <FoundRow node={node} byId={byId} />}
      </VirtualList>
    </Rows>
  );
}

function FoundRow({ node, byId }: { node: LineageNode; byId: ReadonlyMap<string, LineageNode> }) {
  const room = useRoom();
  const [, ...words] = saidOf(node, byId).split(', ');
  return (
    <Row
      href={`/r/${room.id}/lineage/${node.id}`}
      label={saidOf(node, byId)}
      margin={<SexShape sex={node.sex} possible={node.sex !== 'unknown' && !node.sexCertain} />}
      title={<Code>{nameOf(node)}</Code>}
      note={words.join(', ')}
      {...(node.living ? {} : { state: 'Not here now' })}
    />
  );
}
