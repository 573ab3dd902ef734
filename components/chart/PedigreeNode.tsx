import { StyleSheet, View } from 'react-native';
import { Circle, Path, Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import type { PedigreeNodeData } from './PedigreeGraph';

const SIDE = 36;

type Props = { node: PedigreeNodeData; selected: boolean; onSelect: (id: string) => void };

/** Shape and code. The chosen one is filled. */
export function PedigreeNode({ node, selected, onSelect }: Props) {
  const theme = useTheme();
  const { x, y, width, height, label, note } = node;
  return (
    <Press
      aria-label={node.said}
      aria-pressed={selected}
      onPress={() => onSelect(node.id)}
      style={[
        styles.node,
        { left: x - width / 2, top: y - height / 2, width, minHeight: height, backgroundColor: theme.ground },
      ]}
    >
      <NodeShape node={node} selected={selected} />
      <View style={styles.words}>
        <Code size={selected ? 'body' : 'label'} style={selected ? undefined : styles.code}>
          {label}
        </Code>
        {note ? (
          <Text size="label" tone="soft" align="center" cut>
            {note}
          </Text>
        ) : null}
      </View>
    </Press>
  );
}

function NodeShape({ node, selected }: { node: PedigreeNodeData; selected: boolean }) {
  const theme = useTheme();
  const fill = node.stage ? theme.stage[node.stage] : selected ? theme.ink : theme.ground;
  const look = { fill, stroke: theme.ink, strokeWidth: 2, strokeDasharray: node.possible ? '5 3.5' : undefined };
  return (
    <Svg width={SIDE + 4} height={SIDE + 4} viewBox={`-20 -20 40 40`}>
      {selected && node.stage ? <Path d="M-20 20H20" stroke={theme.ink} strokeWidth={4} /> : null}
      {node.sex === 'male' ? <Rect x={-15} y={-15} width={30} height={30} {...look} /> : null}
      {node.sex === 'female' ? <Circle r={15} {...look} /> : null}
      {node.sex === 'unknown' ? <Path d="M0 -18L18 0 0 18-18 0z" {...look} /> : null}
    </Svg>
  );
}

const styles = StyleSheet.create({
  node: { position: 'absolute', alignItems: 'center' },
  words: { alignItems: 'center', maxWidth: '100%', marginTop: -1 },
  code: { fontSize: 14, lineHeight: 17 },
});
