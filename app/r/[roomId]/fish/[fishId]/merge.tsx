import { useLocalSearchParams } from 'expo-router';
import { MergeScreen } from '@/features/fish/MergeScreen';

export default function MergeFish() {
  const { fishId } = useLocalSearchParams<{ fishId: string }>();
  return <MergeScreen key={fishId} fishId={fishId} />;
}
