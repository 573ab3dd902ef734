import { useLocalSearchParams } from 'expo-router';
import { OwnRequestScreen } from '@/features/buyers/OwnRequestScreen';

export default function AskedFor() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <OwnRequestScreen token={token} />;
}
