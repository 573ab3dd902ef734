import { useRef, useState } from 'react';
import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Code } from '@/components/ui/Code';
import { SearchField } from '@/components/ui/SearchField';
import { SexShape } from '@/components/ui/SexShape';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { byNumber } from '@/shared/codes';
import type { LineageNode } from '@/shared/lineage/contract';
import type { Nodes } from './entries';
import { isWanted } from './group';

const MOST_SHOWN = 50;

type Props = { nodes: Nodes; chosen: readonly string[]; onChange: (ids: readonly string[]) => void };

/** Any fish with a code, found by typing; those that are chosen come first. */
export function ChooseFish({ nodes, chosen, onChange }: Props) {
  const anchor = useRef<View>(null);
  const [open, setOpen] = useState(false);
  return (
    <View ref={anchor}>
      <Button
        label={chosen.length === 0 ? 'Choose fish' : `Change the ${chosen.length} fish`}
        onPress={() => setOpen(true)}
      />
      <Sheet
        open={open}
        onClose={() => setOpen(false)}
        title="Choose fish"
        anchor={anchor}
        dock={
          <ButtonRow>
            <Button grow label="Take all out" onPress={() => onChange([])} />
            <Button grow kind="primary" label="Done" onPress={() => setOpen(false)} />
          </ButtonRow>
        }
      >
        <FishChoice nodes={nodes} chosen={chosen} onChange={onChange} />
      </Sheet>
    </View>
  );
}

function FishChoice({ nodes, chosen, onChange }: Props) {
  const [search, setSearch] = useState('');
  // Not the list that changes under the finger: what was chosen when the sheet opened stays on top.
  const [first] = useState(() => new Set(chosen));
  const rank = (node: LineageNode) => (first.has(node.id) ? 0 : node.living ? 1 : 2);
  const matching = nodes
    .filter((node) => node.thing === 'fish' && node.code !== null && isWanted(node, search))
    .sort((a, b) => rank(a) - rank(b) || byNumber(a.code ?? '', b.code ?? ''));
  return (
    <View>
      <SearchField value={search} onChange={setSearch} placeholder="Fish, tank, colony" />
      {matching.slice(0, MOST_SHOWN).map((node) => (
        <CheckRow
          key={node.id}
          label={node.code ?? ''}
          on={chosen.includes(node.id)}
          onChange={(on) => onChange(on ? [...chosen, node.id] : chosen.filter((id) => id !== node.id))}
          note={node.living ? (node.colony?.code ?? node.tank?.code ?? undefined) : 'not here now'}
        >
          <SexShape sex={node.sex} possible={node.sex !== 'unknown' && !node.sexCertain} />
          <Code>{node.code ?? ''}</Code>
        </CheckRow>
      ))}
      {matching.length > MOST_SHOWN ? (
        <Text size="small" tone="soft">
          {`${matching.length - MOST_SHOWN} more. Type to narrow them down.`}
        </Text>
      ) : null}
      {matching.length === 0 ? <Text tone="soft">No fish is like that.</Text> : null}
    </View>
  );
}
