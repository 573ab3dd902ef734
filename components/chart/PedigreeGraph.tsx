import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import type { Stage } from '@/components/theme/theme';
import type { Sex } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { PanZoom } from './PanZoom';
import { PedigreeLines } from './PedigreeLines';
import { PedigreeList } from './PedigreeList';
import { PedigreeNode } from './PedigreeNode';

export type GraphPoint = { x: number; y: number };

/** One animal; `x`, `y` are the middle of its box, as `layoutLineage` places it. */
export type PedigreeNodeData = GraphPoint & {
  id: string;
  width: number;
  height: number;
  /** Its code. */
  label: string;
  sex: Sex;
  /** Sex proposed, not found: dashed. */
  possible?: boolean;
  /** A brood is filled with the colour of its stage. */
  stage?: Stage;
  /** Second line, small: "wild", "29 heads", "dam not drawn". */
  note?: string;
  /** For the list and a screen reader: "DUMA-26C, brood, sire DUMA-A01 79 % or DUMA-A02 21 %, dam DUMA-A04". */
  said: string;
};

/** A parent's line down to its young; `share` under 1 is a possible parent: dashed, with its share. */
export type PedigreeEdgeData = {
  parent: string;
  child: string;
  side: 'sire' | 'dam';
  share: number;
  points: readonly GraphPoint[];
  mark: GraphPoint | null;
};

export type PedigreeRow = { word: string; y: number };

type Props = {
  /** "Pedigree of DUMA-26C". */
  label: string;
  width: number;
  height: number;
  nodes: readonly PedigreeNodeData[];
  edges: readonly PedigreeEdgeData[];
  /** Generations at the left: "F0", "F1 or F2". */
  rows?: readonly PedigreeRow[];
  selected: string | null;
  onSelect: (id: string) => void;
  /** Px; left out: all the room there is. */
  windowHeight?: number;
};

const ROW_WORDS = 44;

/** Oldest on top; certain lines solid, possible ones dashed. The same as a list is one tap away. */
export function PedigreeGraph(props: Props) {
  const { label, width, height, nodes, edges, rows = [], selected, onSelect, windowHeight } = props;
  const [asList, setAsList] = useState(false);
  const left = rows.length > 0 ? ROW_WORDS : 0;
  const focus = nodes.find((node) => node.id === selected) ?? nodes.at(-1);
  const drawing = { width: width + left, height };
  return (
    <View style={windowHeight === undefined || asList ? styles.fill : null}>
      {asList ? (
        <PedigreeList label={label} nodes={nodes} selected={selected} onSelect={onSelect} />
      ) : (
        <PanZoom
          label={label}
          drawing={drawing}
          height={windowHeight}
          focus={focus ? { x: focus.x + left, y: focus.y } : null}
        >
          <View style={{ position: 'absolute', left, top: 0, width, height }}>
            <PedigreeLines width={width} height={height} edges={edges} />
            {nodes.map((node) => (
              <PedigreeNode key={node.id} node={node} selected={node.id === selected} onSelect={onSelect} />
            ))}
          </View>
          {rows.map((row) => (
            <Text
              key={row.y}
              size="small"
              strong
              tone="faint"
              whole
              style={{ position: 'absolute', left: 0, top: row.y - 10 }}
            >
              {row.word}
            </Text>
          ))}
        </PanZoom>
      )}
      <View dataSet={{ printHide: true }} style={styles.foot}>
        <TextLink
          label={asList ? 'Show as a graph' : 'Show as a list'}
          describe={`${asList ? 'Show as a graph' : 'Show as a list'}: ${label}`}
          onPress={() => setAsList(!asList)}
        />
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0 },
  foot: { alignItems: 'flex-start' },
});
