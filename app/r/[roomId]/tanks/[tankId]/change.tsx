import { useLocalSearchParams } from 'expo-router';
import { ChangeTankScreen } from '@/features/tanks/TankForm';

export default function ChangeTank() {
  const { tankId } = useLocalSearchParams<{ tankId: string }>();
  return <ChangeTankScreen tankId={tankId} />;
}
