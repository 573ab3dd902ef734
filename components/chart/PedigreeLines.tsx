import { curveBumpY, line } from 'd3-shape';
import { StyleSheet, View } from 'react-native';
import { Path, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Text } from '@/components/ui/Text';
import type { GraphPoint, PedigreeEdgeData } from './PedigreeGraph';
import { isCertain, shareWord } from './shareWord';

const curve = line<GraphPoint>()
  .x((point) => point.x)
  .y((point) => point.y)
  .curve(curveBumpY);

type Props = { width: number; height: number; edges: readonly PedigreeEdgeData[] };

/** The lines under the animals: a line that crosses another passes over it with a gap. */
export function PedigreeLines({ width, height, edges }: Props) {
  const theme = useTheme();
  return (
    <>
      <View aria-hidden style={StyleSheet.absoluteFill}>
        <Svg width={width} height={height}>
          {edges.map((edge) => {
            const certain = isCertain(edge.share);
            const d = curve(routeOf(edge, certain)) ?? '';
            return [
              <Path key={`${keyOf(edge)} gap`} d={d} fill="none" stroke={theme.ground} strokeWidth={7} />,
              <Path
                key={keyOf(edge)}
                d={d}
                fill="none"
                stroke={certain ? theme.ink2 : theme.ink}
                strokeWidth={certain ? 1.75 : 1 + 1.75 * edge.share}
                strokeDasharray={certain ? undefined : '6 4'}
              />,
            ];
          })}
        </Svg>
      </View>
      {edges.map((edge) =>
        edge.mark && !isCertain(edge.share) ? (
          <View key={`${keyOf(edge)} share`} style={[styles.mark, { left: edge.mark.x - 28, top: edge.mark.y - 11 }]}>
            <Text
              aria-hidden
              size="label"
              strong
              style={{ fontSize: 15, lineHeight: 20, paddingHorizontal: 4, backgroundColor: theme.ground }}
            >
              {shareWord(edge.share)}
            </Text>
          </View>
        ) : null,
      )}
    </>
  );
}

/** Between neighbouring rows nothing stands in the way: one bend, unless a share has its place on the line. */
const routeOf = ({ points }: PedigreeEdgeData, certain: boolean): GraphPoint[] =>
  certain && points.length <= 3 ? [points[0], points.at(-1)].filter((point) => point !== undefined) : [...points];

const keyOf = (edge: PedigreeEdgeData) => `${edge.parent} ${edge.child} ${edge.side}`;

const styles = StyleSheet.create({ mark: { position: 'absolute', width: 56, alignItems: 'center' } });
