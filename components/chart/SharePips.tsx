import { Rect, Svg } from 'react-native-svg';
import { useTheme } from '@/components/theme/ThemeProvider';

const PER_BAR = 0.02;
const STEP = 6.2;

/** A share as bars, one for every 2 %, never none. `marked`: the one that matters now. */
export function SharePips({ share, height, marked = false }: { share: number; height: number; marked?: boolean }) {
  const theme = useTheme();
  const count = Math.max(1, Math.round(share / PER_BAR));
  return (
    <Svg width={count * STEP} height={height}>
      {Array.from({ length: count }, (_, i) => i * STEP).map((x) => (
        <Rect key={x} x={x} y={0} width={4.3} height={height} fill={marked ? theme.stage.subadult : theme.control} />
      ))}
    </Svg>
  );
}
