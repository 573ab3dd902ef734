import { HoldRows } from '@/features/holds/HoldRows';
import { TodayScreen } from '@/features/today/TodayScreen';

export default function Today() {
  return <TodayScreen holdRows={(holds) => <HoldRows holds={holds} />} />;
}
