import { View } from 'react-native';
import { Polygon, Svg } from 'react-native-svg';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type Stage, stages, stageWords } from '@/components/theme/theme';
import type { TextSize } from '@/components/theme/type';
import { markBars, markBox, markHeight } from './markBars';
import { Text } from './Text';

type Props = {
  stage: Stage;
  /** 24 in rows, 34 in headers, 44 alone. */
  width?: number;
  /** With its word beside it, as it has to be wherever there is room. */
  word?: boolean;
  size?: TextSize;
  strong?: boolean;
};

/** Stage n of 6: the mark with n bars filled. Colour is never alone, the bars and the word say it too. */
export function StageGlyph({ stage, width = 24, word = false, size, strong }: Props) {
  const theme = useTheme();
  const filled = stages.indexOf(stage) + 1;
  const color = theme.stage[stage];
  return (
    <View
      role="img"
      aria-label={`Stage ${filled} of 6, ${stageWords[stage]}`}
      style={{ flexDirection: 'row', alignItems: 'center', gap: space[2] }}
    >
      <Svg width={width} height={markHeight(width)} viewBox={`-0.5 0 ${markBox.width + 1} ${markBox.height}`}>
        {markBars.map((points, i) =>
          i < filled ? (
            <Polygon key={points} points={points} fill={color} />
          ) : (
            <Polygon key={points} points={points} fill="none" stroke={theme.control} strokeWidth={1} />
          ),
        )}
      </Svg>
      {word ? (
        <Text size={size} strong={strong} whole aria-hidden>
          {stageWords[stage]}
        </Text>
      ) : null}
    </View>
  );
}
