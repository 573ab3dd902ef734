import { useLocalSearchParams } from 'expo-router';
import { ColonyScreen } from '@/features/colonies/ColonyScreen';
import { PhotoStrip } from '@/features/photos/PhotoStrip';
import { History } from '@/features/record/History';

export default function Colony() {
  const { colonyId } = useLocalSearchParams<{ colonyId: string }>();
  return (
    <ColonyScreen
      colonyId={colonyId}
      photos={<PhotoStrip of={{ thing: 'colony', thingId: colonyId }} />}
      history={<History thing="colony" id={colonyId} />}
    />
  );
}
