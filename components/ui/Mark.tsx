import { View } from 'react-native';
import { G, Polygon, Svg } from 'react-native-svg';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { stages } from '@/components/theme/theme';
import { markBars, markBox, markHeight } from './markBars';
import { Text } from './Text';

type Props = {
  /** At least 18 px. */
  width?: number;
  /** `ink`: the product's own; `stages`: the door's large drawing; `mono`: print; `empty`: nothing here yet. */
  look?: 'ink' | 'stages' | 'mono' | 'empty';
};

/** Six bars that trace a fish; the one in the mouth is amber. Never turned, mirrored or set on a photo. */
export function Mark({ width = 30, look = 'ink' }: Props) {
  const theme = useTheme();
  const fills = stages.map((stage, i) =>
    look === 'stages' || (look !== 'mono' && i === 0) ? theme.stage[stage] : look === 'empty' ? 'none' : theme.ink,
  );
  const scale = width / markBox.width;
  return (
    <View aria-hidden style={{ width, height: markHeight(width) }}>
      <Svg width={width} height={markHeight(width)}>
        <G transform={`scale(${scale})`}>
          {markBars.map((points, i) => (
            <Polygon
              key={points}
              points={points}
              fill={fills[i]}
              {...(look === 'empty'
                ? { stroke: theme.control, strokeWidth: 1.25 / scale, strokeDasharray: `${5 / scale} ${4 / scale}` }
                : {})}
            />
          ))}
        </G>
      </Svg>
    </View>
  );
}

/** The mark with the product's name. */
export function Wordmark({ markWidth = 30 }: { markWidth?: number }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space[2] + 2 }}>
      <Mark width={markWidth} />
      <Text strong style={{ fontSize: markWidth * 0.78, lineHeight: markWidth, letterSpacing: -0.0156 * markWidth }}>
        Kinwater
      </Text>
    </View>
  );
}
