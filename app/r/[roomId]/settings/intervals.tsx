import { IntervalsScreen } from '@/features/today/IntervalsScreen';

export default function Intervals() {
  return <IntervalsScreen />;
}
