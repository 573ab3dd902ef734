import { useLocalSearchParams } from 'expo-router';
import { PhotoStrip } from '@/features/photos/PhotoStrip';
import { History } from '@/features/record/History';
import { TankScreen } from '@/features/tanks/TankScreen';

export default function Tank() {
  const { tankId } = useLocalSearchParams<{ tankId: string }>();
  return (
    <TankScreen
      tankId={tankId}
      photos={<PhotoStrip of={{ thing: 'tank', thingId: tankId }} />}
      history={<History thing="tank" id={tankId} />}
    />
  );
}
