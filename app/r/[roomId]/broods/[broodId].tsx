import { useLocalSearchParams } from 'expo-router';
import { BroodScreen } from '@/features/broods/BroodScreen';
import { History } from '@/features/record/History';

export default function Brood() {
  const { broodId } = useLocalSearchParams<{ broodId: string }>();
  return (
    <BroodScreen
      broodId={broodId}
      growth={null}
      photos={null}
      inbreeding={null}
      history={<History thing="brood" id={broodId} />}
    />
  );
}
