import { View } from 'react-native';
import { Rect, Svg } from 'react-native-svg';
import { light } from '@/components/theme/light';

type Square = { size: number; bars: { row: number; column: number; length: number }[] };

const QUIET = 4;
const SIDE = 220;

/** Dark on light in both themes, with the quiet border that cameras need. */
export function SquareCode({ square, label }: { square: Square; label: string }) {
  const whole = square.size + 2 * QUIET;
  return (
    <View role="img" aria-label={label} style={{ width: SIDE, height: SIDE }}>
      <Svg width={SIDE} height={SIDE} viewBox={`0 0 ${whole} ${whole}`}>
        <Rect width={whole} height={whole} fill={light.sheet} />
        {square.bars.map(({ row, column, length }) => (
          <Rect
            key={`${row}-${column}`}
            x={column + QUIET}
            y={row + QUIET}
            width={length}
            height={1.02}
            fill={light.ink}
          />
        ))}
      </Svg>
    </View>
  );
}
