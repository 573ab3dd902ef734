import { G, Path } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';
import { ChartText } from './ChartText';
import type { GrowthTarget } from './GrowthChart';
import type { GrowthField } from './growthField';

/** Dotted to a diamond at the day half are there; the range of that day is a whisker on the axis. */
export function TargetMark({ target, field }: { target: GrowthTarget; field: GrowthField }) {
  const theme = useTheme();
  const { x, y, left, right, base } = field;
  const at = target.day === null ? null : x(target.day);
  const shown = at !== null && at <= right && at >= left;
  const level = y(target.value);
  const dotted = { fill: 'none', stroke: theme.ink, strokeWidth: 1.25, strokeDasharray: '2 3' };
  const [from, to] = [target.from, target.to].map((day) =>
    day === null ? null : Math.min(right, Math.max(left, x(day))),
  );
  return (
    <G>
      <Path d={shown ? `M${left} ${level}H${at}V${base}` : `M${left} ${level}H${right}`} {...dotted} />
      {shown ? <Path d={`M${at} ${level - 6}l6 6-6 6-6-6z`} fill={theme.ink} /> : null}
      {typeof from === 'number' && typeof to === 'number' && to > from ? (
        <Path
          d={`M${from} ${base - 9}H${to}M${from} ${base - 13}v8M${to} ${base - 13}v8`}
          stroke={theme.ink}
          strokeWidth={1.75}
          fill="none"
        />
      ) : null}
      <ChartText x={left + 6} y={level - 6} strong>
        {target.word}
      </ChartText>
    </G>
  );
}
