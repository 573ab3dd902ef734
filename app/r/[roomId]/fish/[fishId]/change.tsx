import { useLocalSearchParams } from 'expo-router';
import { ChangeFishScreen } from '@/features/fish/ChangeFishScreen';

export default function ChangeFish() {
  const { fishId } = useLocalSearchParams<{ fishId: string }>();
  return <ChangeFishScreen fishId={fishId} />;
}
