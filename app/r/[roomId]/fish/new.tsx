import { useLocalSearchParams } from 'expo-router';
import { NewFishScreen } from '@/features/fish/NewFishScreen';

export default function NewFish() {
  const { strain, colony } = useLocalSearchParams<{ strain?: string; colony?: string }>();
  return <NewFishScreen strainId={strain} colonyId={colony} />;
}
