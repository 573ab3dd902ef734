import { useLocalSearchParams } from 'expo-router';
import { RequestScreen } from '@/features/buyers/RequestsScreen';

export default function OneRequests() {
  const { requestId } = useLocalSearchParams<{ requestId: string }>();
  return <RequestScreen kind="fish" requestId={requestId} />;
}
