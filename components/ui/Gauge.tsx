import { StyleSheet, View } from 'react-native';
import { Path, Rect, Svg } from 'react-native-svg';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { type MaybeAction, Press } from './Press';
import { Text } from './Text';

export type GaugeReading = {
  /** On the scale below, in the unit shown. */
  at: number;
  /** Ends of the line. */
  least: number;
  most: number;
  /** The range kept: the band. Open ends are left out. */
  from?: number;
  to?: number;
};

const WIDTH = 112;
const HEIGHT = 26;

/** Outside of the range kept. */
export const isOut = ({ at, from, to }: GaugeReading): boolean =>
  (from !== undefined && at < from) || (to !== undefined && at > to);

/** The line, the band of the range, a bar at the reading. */
function GaugeLine(reading: GaugeReading) {
  const theme = useTheme();
  const { at, least, most, from = least, to = most } = reading;
  const x = (value: number) =>
    (Math.min(most, Math.max(least, value)) - least) * (WIDTH / Math.max(most - least, 1e-9));
  return (
    <Svg width="100%" height={HEIGHT} viewBox={`0 0 ${WIDTH} ${HEIGHT}`} preserveAspectRatio="none">
      <Path d={`M0 13.5H${WIDTH}`} stroke={theme.control} />
      <Rect x={x(from)} y={7} width={Math.max(1, x(to) - x(from))} height={13} fill={theme.band} />
      <Rect
        x={Math.min(WIDTH - 5, Math.max(0, x(at) - 2.5))}
        y={2}
        width={5}
        height={23}
        fill={isOut(reading) ? theme.trouble : theme.ink}
      />
    </Svg>
  );
}

type Props = MaybeAction & {
  name: string;
  /** "26.0". */
  value: string;
  unit?: string;
  /** Left out where no range is set: then only the value is shown. */
  reading?: GaugeReading;
  /** "your range 24 to 27". Said to a screen reader with the value. */
  range?: string;
};

/** One measured thing of the water, its value and where it stands in the range. */
export function GaugeRow({ name, value, unit, reading, range, href, onPress }: Props) {
  const theme = useTheme();
  const out = reading ? isOut(reading) : false;
  const said = [`${name} ${value}${unit ? ` ${unit}` : ''}`, range, out ? 'out of range' : null]
    .filter(Boolean)
    .join(', ');
  const body = (
    <>
      <Text style={styles.name}>{name}</Text>
      <Text align="right" tone={out ? 'trouble' : 'ink'} style={styles.value}>
        <Text strong>{value}</Text>
        {unit ? (
          <Text size="label" tone={out ? 'trouble' : 'soft'}>
            {` ${unit}`}
          </Text>
        ) : null}
      </Text>
      <View
        aria-hidden={!reading}
        role="meter"
        aria-label={name}
        aria-valuenow={reading?.at}
        aria-valuemin={reading?.least}
        aria-valuemax={reading?.most}
        aria-valuetext={said}
        style={styles.gauge}
      >
        {reading ? <GaugeLine {...reading} /> : null}
      </View>
    </>
  );
  const look = [styles.row, { borderBottomColor: theme.rule }];
  if (href === undefined && onPress === undefined) return <View style={look}>{body}</View>;
  return (
    <Press
      href={href}
      onPress={onPress}
      aria-label={said}
      style={({ pressed, hovered }) => [look, pressed || hovered ? { backgroundColor: theme.well } : null]}
    >
      {body}
    </Press>
  );
}

const styles = StyleSheet.create({
  row: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    columnGap: 14,
    minHeight: 44,
    borderBottomWidth: line.row,
    paddingVertical: space[1],
  },
  name: { flexGrow: 1, flexShrink: 1, flexBasis: 104, minWidth: 0 },
  value: { minWidth: 84, flexShrink: 0 },
  gauge: { flexGrow: 10, flexShrink: 1, flexBasis: 80, maxWidth: WIDTH },
});
