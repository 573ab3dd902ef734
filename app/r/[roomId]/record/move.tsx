import { useLocalSearchParams } from 'expo-router';
import { MoveForm } from '@/features/fishEntries/MoveForm';

export default function Move() {
  const { tank, colony, batch, fish } = useLocalSearchParams<{
    tank?: string;
    colony?: string;
    batch?: string;
    fish?: string;
  }>();
  return <MoveForm tankId={tank} colonyId={colony} batchId={batch} fishId={fish} />;
}
