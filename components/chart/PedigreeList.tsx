import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SexShape } from '@/components/ui/SexShape';
import { VirtualList } from '@/components/ui/VirtualList';
import type { PedigreeNodeData } from './PedigreeGraph';

type Props = {
  label: string;
  nodes: readonly PedigreeNodeData[];
  selected: string | null;
  onSelect: (id: string) => void;
};

/** The pedigree in words, oldest first: each animal with its parents. */
export function PedigreeList({ label, nodes, selected, onSelect }: Props) {
  const oldestFirst = [...nodes].sort((a, b) => a.y - b.y || a.x - b.x);
  return (
    <Rows label={label}>
      <VirtualList items={oldestFirst} keyOf={(node) => node.id}>
        {(node) => (
          <Row
            label={node.said}
            onPress={() => onSelect(node.id)}
            selected={node.id === selected}
            lead={<SexShape sex={node.sex} possible={node.possible} size={18} />}
            title={<Code>{node.label}</Code>}
            note={node.said}
          />
        )}
      </VirtualList>
    </Rows>
  );
}
