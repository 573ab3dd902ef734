import { useLocalSearchParams } from 'expo-router';
import { BatchRedirect } from '@/features/broods/BatchRedirect';

export default function Batch() {
  const { batchId } = useLocalSearchParams<{ batchId: string }>();
  return <BatchRedirect batchId={batchId} />;
}
