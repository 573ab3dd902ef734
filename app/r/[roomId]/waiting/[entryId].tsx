import { useLocalSearchParams } from 'expo-router';
import { ClashFacts } from '@/features/holds/ClashFacts';
import { ConflictScreen } from '@/features/queue/ConflictScreen';

export default function ConflictPage() {
  const { entryId } = useLocalSearchParams<{ entryId: string }>();
  return <ConflictScreen entryId={entryId} holdFacts={(facts) => <ClashFacts {...facts} />} />;
}
