import { useLocalSearchParams } from 'expo-router';
import { HoldScreen } from '@/features/holds/HoldScreen';
import { History } from '@/features/record/History';

export default function Hold() {
  const { holdId } = useLocalSearchParams<{ holdId: string }>();
  return <HoldScreen holdId={holdId} history={<History thing="hold" id={holdId} />} />;
}
