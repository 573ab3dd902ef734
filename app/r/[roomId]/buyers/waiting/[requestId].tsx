import { useLocalSearchParams } from 'expo-router';
import { RequestScreen } from '@/features/buyers/RequestsScreen';

export default function OneWaiting() {
  const { requestId } = useLocalSearchParams<{ requestId: string }>();
  return <RequestScreen kind="notice" requestId={requestId} />;
}
