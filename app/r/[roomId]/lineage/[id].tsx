import { useLocalSearchParams } from 'expo-router';
import { LineageOfScreen } from '@/features/lineage/LineageOfScreen';
import { CameBySheet } from '@/features/sheets/CameBySheet';

export default function LineageOf() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return <LineageOfScreen id={id} sheet={<CameBySheet fishId={id} />} />;
}
